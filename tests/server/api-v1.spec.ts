/** The API for programs: tokens, methods, notes in interchange. */
import { beforeAll, afterAll, expect, test } from 'vitest';
import { eq } from 'drizzle-orm';
import { z } from 'zod';
import './setup';
import { cookieOf, makePerson } from './fixtures';

const { db } = await import('$lib/server/db');
const { apiToken } = await import('$lib/server/db/schema');
const { makeApiToken, apiTokensOf, revokeApiToken } = await import('$lib/server/auth/api-tokens');
const { signOutEverywhere } = await import('$lib/server/people/accounts');
const { openApi } = await import('$lib/server/engine/openapi');
const { closeEngine } = await import('$lib/server/engine/evaluate');
const { handle, handleError } = await import('../../src/hooks.server');
const routes = {
	'/api/v1/methods': await import('../../src/routes/api/v1/methods/+server'),
	'/api/v1/methods/[name]': await import('../../src/routes/api/v1/methods/[name]/+server'),
	'/api/v1/evaluate': await import('../../src/routes/api/v1/evaluate/+server'),
	'/api/v1/openapi.json': await import('../../src/routes/api/v1/openapi.json/+server'),
	'/api/v1/schemas/note': await import('../../src/routes/api/v1/schemas/note/+server')
};

type Asked = {
	method?: 'GET' | 'POST';
	token?: string;
	cookie?: string;
	name?: string;
	body?: unknown;
	from?: string;
};

/** Asks a route behind the hooks, as SvelteKit does. */
async function ask(id: keyof typeof routes, asked: Asked = {}): Promise<Response> {
	const { method = asked.body === undefined ? 'GET' : 'POST', token, cookie, name = '' } = asked;
	const url = new URL(`http://127.0.0.1:4173${id.replace('[name]', name)}`);
	const headers = new Headers();
	if (token !== undefined) headers.set('authorization', `Bearer ${token}`);
	if (cookie !== undefined) headers.set('cookie', cookie);
	const body =
		typeof asked.body === 'string' || asked.body === undefined
			? asked.body
			: JSON.stringify(asked.body);
	const event = {
		request: new Request(url, { method, headers, body: body as string | undefined }),
		url,
		params: { name },
		route: { id },
		locals: { person: null, sessionId: null },
		getClientAddress: () => asked.from ?? '192.0.2.7'
	} as never;
	const call = (routes[id] as Record<string, (event: never) => Promise<Response>>)[method]!;
	return handle({
		event,
		resolve: async () => {
			try {
				return await call(event);
			} catch (error) {
				await handleError({ error, event, status: 500, message: 'Internal Error' });
				return new Response(null, { status: 500 });
			}
		}
	}) as Promise<Response>;
}

const person = await makePerson();
const token = (scope: 'read' | 'evaluate', days: number | '' = '') =>
	makeApiToken(person.id, { name: 'sizing script', scope, days });
let evaluating: string;
let reading: string;

beforeAll(async () => {
	evaluating = await token('evaluate');
	reading = await token('read');
});
afterAll(closeEngine);

const earth = { kind: 'body', body: 'earth' };
const steel = { site: earth, density: 7900, stress: 5e9 };

test('methods are listed with the schemas of what goes in and comes out', async () => {
	const answer = await ask('/api/v1/methods', { token: reading });
	const { engine, methods } = await answer.json();
	expect(answer.status).toBe(200);
	expect(engine).toMatch(/^\d+/);
	const names = methods.map(({ name }: { name: string }) => name);
	expect(names).toContain('uniform-line');
	for (const { inputs, outputs } of methods)
		expect([inputs.$schema, outputs.type]).toEqual([
			'https://json-schema.org/draft/2020-12/schema',
			'object'
		]);
});

test('a method answers in SI with the engine’s version', async () => {
	const answer = await ask('/api/v1/methods/[name]', {
		token: evaluating,
		name: 'uniform-line',
		body: steel
	});
	expect(answer.status).toBe(200);
	const { engine, outputs } = await answer.json();
	expect(engine).toMatch(/^\d+/);
	// 382.5 GPa: consistency figure computed outside with SciPy.
	expect(outputs.peakStress / 1e9).toBeCloseTo(382.5, 1);
});

test('what cannot be computed is a problem in words with its places', async () => {
	const answer = await ask('/api/v1/methods/[name]', {
		token: evaluating,
		name: 'uniform-line',
		body: { ...steel, density: -1 }
	});
	expect(answer.status).toBe(422);
	expect(answer.headers.get('content-type')).toBe('application/problem+json');
	expect(await answer.json()).toMatchObject({
		detail: 'density must be above 0; it is -1.',
		code: 'input',
		faults: [{ path: 'density' }]
	});
});

test('a method that does not exist is answered with names like it', async () => {
	const answer = await ask('/api/v1/methods/[name]', {
		token: evaluating,
		name: 'uniform-lin',
		body: {}
	});
	expect(answer.status).toBe(404);
	expect(await answer.json()).toMatchObject({ near: ['uniform-line'] });
});

const given = { kind: 'given', source: '', description: '', uncertainty: '1.9' };
const calculation = { kind: 'calculation', description: '', digits: '', unit: 'GPa' };

test('a note in interchange comes back with the result of each item, faults as well', async () => {
	const note = {
		format: 'holdfast-note',
		version: 1,
		thinLimit: '0.10',
		items: [
			{ id: 'a', symbol: 'σ_al', value: '110', unit: 'GPa', ...given },
			{ id: 'b', symbol: 'σ_d', expression: 'σ_al/1.75', ...calculation },
			{ id: 'c', symbol: 'x', expression: 'σ_al + 1 m', ...calculation }
		]
	};
	const answer = await ask('/api/v1/evaluate', { token: evaluating, body: note });
	expect(answer.status).toBe(200);
	const { results } = await answer.json();
	expect(results[1].outcome.quantity).toMatchObject({ unit: 'GPa' });
	// By hand: 110/1.75 and 1.9/1.75.
	expect(results[1].outcome.quantity.value).toBeCloseTo(62.857142857, 8);
	expect(results[1].outcome.quantity.uncertainty).toBeCloseTo(1.0857142857, 8);
	expect(results[2].outcome).toMatchObject({ state: 'fault', faults: [{ code: 'dimension' }] });
});

test('what is no note is refused with the places that are wrong', async () => {
	const wrong = { format: 'holdfast-note', version: 1, thinLimit: '', items: [{ kind: 'poem' }] };
	const answer = await ask('/api/v1/evaluate', { token: evaluating, body: wrong });
	expect(answer.status).toBe(422);
	const { errors } = await answer.json();
	expect(errors[0].field).toBe('items.0.kind');
	expect((await ask('/api/v1/evaluate', { token: evaluating, body: 'no JSON' })).status).toBe(400);
});

test('a note of a version to come is told which is known and where it is described', async () => {
	const body = { format: 'holdfast-note', version: 2, thinLimit: '', items: [] };
	const answer = await ask('/api/v1/evaluate', { token: evaluating, body });
	expect(answer.status).toBe(422);
	const { errors } = await answer.json();
	expect(errors).toEqual([
		{ field: 'version', message: expect.stringMatching(/known here is 1;.*docs\/interchange\.md/) }
	]);
});

test('the description is open to anybody and has every address', async () => {
	const answer = await ask('/api/v1/openapi.json');
	const { paths } = await answer.json();
	const known = Object.keys(paths).map((path) =>
		path.replace(/^(\/api\/v1\/methods)\/.+$/, '$1/[name]')
	);
	expect([...new Set(known)].sort()).toEqual(
		Object.keys(routes)
			.filter((id) => !id.endsWith('openapi.json'))
			.sort()
	);
});

test('answers are such as the description says', async () => {
	const { components, paths } = openApi();
	const moved = (schema: unknown) =>
		JSON.parse(JSON.stringify(schema).replaceAll('#/components/schemas/', '#/$defs/'));
	const of = (path: string, verb: string) => {
		const { responses } = paths[path]![verb] as never as {
			responses: { 200: { content: Record<string, { schema: object }> } };
		};
		const [{ schema }] = Object.values(responses[200].content) as [{ schema: object }];
		return z.fromJSONSchema(moved({ ...schema, $defs: components.schemas }));
	};
	const note = {
		format: 'holdfast-note',
		version: 1,
		thinLimit: '',
		items: [
			{ ...given, id: 'a', symbol: 'a', value: '2', unit: 'km', uncertainty: '1' },
			{ ...calculation, id: 'b', symbol: 'b', expression: '[a, 2*a]', unit: '' },
			{ ...calculation, id: 'c', symbol: 'c', expression: 'a + nothing', unit: '' },
			{ ...calculation, id: 'd', symbol: 'd', expression: 'c', unit: '' },
			{ ...calculation, id: 'e', symbol: 'e', expression: '', unit: '' },
			{
				...{ id: 'f', kind: 'check', description: '', left: 'a', relation: 'le', right: '1 km' },
				...{ tolerance: '', required: '' }
			}
		]
	};
	const asked = [
		['/api/v1/methods', '/api/v1/methods', undefined],
		['/api/v1/methods/uniform-line', '/api/v1/methods/[name]', undefined],
		['/api/v1/methods/uniform-line', '/api/v1/methods/[name]', steel],
		['/api/v1/evaluate', '/api/v1/evaluate', note]
	] as const;
	for (const [path, id, body] of asked) {
		const answer = await ask(id, { token: evaluating, name: 'uniform-line', body });
		const schema = of(path, body === undefined ? 'get' : 'post');
		expect(answer.status, path).toBe(200);
		expect(schema.safeParse(await answer.json()).error, path).toBeUndefined();
	}
});

test('the schema of the interchange format is served', async () => {
	const answer = await ask('/api/v1/schemas/note', { token: reading });
	expect(answer.headers.get('content-type')).toBe('application/schema+json');
	expect(await answer.json()).toMatchObject({
		type: 'object',
		required: expect.arrayContaining(['items'])
	});
});

test('a token that only reads runs nothing', async () => {
	const body = steel;
	const answer = await ask('/api/v1/methods/[name]', {
		token: reading,
		name: 'uniform-line',
		body
	});
	expect(answer.status).toBe(403);
	expect((await ask('/api/v1/evaluate', { token: reading, body: {} })).status).toBe(403);
});

test('missing, unknown, expired and revoked tokens, and a session, are answered alike', async () => {
	const lapsed = await token('evaluate', 1);
	await db
		.update(apiToken)
		.set({ expiresAt: new Date(0) })
		.where(eq(apiToken.begins, lapsed.slice(0, 13)));
	const revoked = await token('evaluate');
	const mine = await apiTokensOf(person.id);
	await revokeApiToken(person.id, mine.find(({ begins }) => revoked.startsWith(begins))!.id);
	const tries: Asked[] = [
		{},
		{ token: 'holdfast_' + 'x'.repeat(43) },
		{ token: lapsed },
		{ token: revoked },
		{ cookie: await cookieOf(person) }
	];
	const answers = await Promise.all(tries.map((asked) => ask('/api/v1/methods', asked)));
	const bodies = await Promise.all(answers.map((answer) => answer.text()));
	expect(answers.map(({ status }) => status)).toEqual([401, 401, 401, 401, 401]);
	expect(new Set(bodies).size).toBe(1);
	expect(answers[0]!.headers.get('www-authenticate')).toBe('Bearer');
});

test('a token that has expired leaves its place to another', async () => {
	const owner = await makePerson();
	const make = () => makeApiToken(owner.id, { name: 'nightly', scope: 'read', days: 1 });
	for (let n = 0; n < 20; n += 1) await make();
	await expect(make()).rejects.toMatchObject({ status: 409 });
	const [first] = await apiTokensOf(owner.id);
	await db
		.update(apiToken)
		.set({ expiresAt: new Date(0) })
		.where(eq(apiToken.id, first!.id));
	await make();
	await expect(make()).rejects.toMatchObject({ status: 409 });
});

test('of a token only its digest and its first letters are stored', async () => {
	const [row] = await db.select().from(apiToken).where(eq(apiToken.userId, person.id));
	expect(JSON.stringify(row)).not.toContain(evaluating.slice(14));
	expect(row!.tokenHash).toMatch(/^[0-9a-f]{64}$/);
	expect(row!.lastUsedAt).toBeInstanceOf(Date);
});

test('nobody revokes the token of somebody else', async () => {
	const stranger = await makePerson();
	const [mine] = await apiTokensOf(person.id);
	await expect(revokeApiToken(stranger.id, mine!.id)).rejects.toMatchObject({ status: 404 });
	expect((await ask('/api/v1/methods', { token: evaluating })).status).toBe(200);
});

test('ending every session revokes every token as well', async () => {
	const leaver = await makePerson();
	const left = await makeApiToken(leaver.id, { name: 'old script', scope: 'read', days: '' });
	expect((await ask('/api/v1/methods', { token: left })).status).toBe(200);
	await signOutEverywhere(leaver.id);
	expect((await ask('/api/v1/methods', { token: left })).status).toBe(401);
});

test('one person has two methods computed at a time', async () => {
	// Long enough that four of them meet.
	const body = {
		...{ method: 'uniform-line', input: steel, outputs: ['peakStress'], samples: 40_000 },
		uncertain: [{ path: 'density', distribution: { kind: 'normal', mean: 7900, u: 79 } }]
	};
	const run = () => ask('/api/v1/methods/[name]', { token: evaluating, name: 'monte-carlo', body });
	const statuses = (await Promise.all([run(), run(), run(), run()])).map(({ status }) => status);
	expect(statuses.filter((status) => status === 429).length).toBeGreaterThan(0);
	expect((await run()).status).toBe(200);
});

test('a token asks so often a minute, and is told when it may again', async () => {
	const eager = await makeApiToken((await makePerson()).id, {
		name: 'loop',
		scope: 'read',
		days: ''
	});
	const statuses: number[] = [];
	let last: Response | undefined;
	for (let n = 0; n < 125 && last?.status !== 429; n += 1) {
		last = await ask('/api/v1/schemas/note', { token: eager });
		statuses.push(last.status);
	}
	expect(statuses.at(-1)).toBe(429);
	expect(statuses).toHaveLength(121);
	expect(Number(last!.headers.get('retry-after'))).toBeGreaterThan(0);
});

test('guessing tokens from one network comes to an end', async () => {
	const statuses = [];
	for (let n = 0; n < 61; n += 1)
		statuses.push(
			(await ask('/api/v1/methods', { token: 'y'.repeat(40), from: '192.0.2.99' })).status
		);
	expect(statuses.at(-1)).toBe(429);
	expect(statuses.at(-2)).toBe(401);
});
