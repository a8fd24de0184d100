/** Calls a route as SvelteKit does behind its hooks: `handle`, then the load, action or method. */
import { isHttpError, isRedirect, type RequestEvent } from '@sveltejs/kit';
import { handle, handleError } from '../../src/hooks.server';

type Handler = (event: RequestEvent) => unknown;
type Module = { load?: Handler; actions?: Record<string, Handler> } & Record<string, unknown>;

const modules = import.meta.glob<Module>('../../src/routes/**/+{page,layout,}*server.ts');

const METHODS = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE'];

export type Entry = { name: string; id: string; method: string; call: Handler };

/** Every load, action and method of every route; named "load /programmes", "POST /api/…". */
export async function everyEntry(): Promise<Entry[]> {
	const entries: Entry[] = [];
	for (const [file, read] of Object.entries(modules)) {
		const id = file.replace('../../src/routes', '').replace(/\/\+[a-z.]*server\.ts$/, '') || '/';
		const module = await read();
		const kind = file.includes('+layout') ? 'layout' : 'load';
		const shown = kind === 'layout' ? id : withoutGroup(id);
		if (module.load)
			entries.push({ name: `${kind} ${shown}`, id, method: 'GET', call: module.load });
		for (const [action, call] of Object.entries(module.actions ?? {}))
			entries.push({ name: `?/${action} ${shown}`, id, method: 'POST', call });
		for (const method of METHODS)
			if (method in module)
				entries.push({ name: `${method} ${shown}`, id, method, call: module[method] as Handler });
	}
	return entries;
}

const withoutGroup = (id: string) => id.replace(/\/\([a-z]+\)/, '') || '/';

export type Asked = {
	params: Record<string, string>;
	cookie: string | null;
	body?: BodyInit;
	query?: string;
};

/** The status of the answer. */
export async function statusOf({ id, method, call }: Entry, asked: Asked): Promise<number> {
	const path = withoutGroup(id).replace(
		/\[(\w+)\]/g,
		(_, name: string) => asked.params[name] ?? name
	);
	const url = new URL(`http://127.0.0.1:4173${path}${asked.query ?? ''}`);
	const headers = new Headers(asked.cookie ? { cookie: asked.cookie } : {});
	if (method !== 'GET') headers.set('origin', url.origin);
	const body = method === 'GET' ? undefined : (asked.body ?? new URLSearchParams());
	const event = {
		request: new Request(url, { method, headers, body }),
		url,
		params: asked.params,
		route: { id },
		locals: { person: null, sessionId: null },
		cookies: { get: () => undefined, set: () => {}, delete: () => {} },
		getClientAddress: () => '192.0.2.1',
		setHeaders: () => {},
		depends: () => {},
		parent: async () => ({})
	} as unknown as RequestEvent;
	try {
		const response = await handle({ event, resolve: async () => answer(event, call) });
		await response.body?.cancel();
		return response.status;
	} catch (thrown) {
		if (isRedirect(thrown)) return thrown.status;
		throw thrown;
	}
}

async function answer(event: RequestEvent, call: Handler): Promise<Response> {
	try {
		const result = await call(event);
		if (result instanceof Response) return result;
		const { status } = (result ?? {}) as { status?: unknown };
		return new Response(null, { status: typeof status === 'number' ? status : 200 });
	} catch (thrown) {
		if (isRedirect(thrown)) return new Response(null, { status: thrown.status });
		if (isHttpError(thrown)) return new Response(null, { status: thrown.status });
		await handleError({ error: thrown, event, status: 500, message: 'Internal Error' });
		return new Response(null, { status: 500 });
	}
}
