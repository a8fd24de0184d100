/**
 * What happens to every request: who is asking, whether they may be here at all, and how a failure is
 * told. A thrown `Problem` is an answer (problem+json from /api, a sheet with its words elsewhere);
 * anything else is logged whole and told with a reference only.
 */
import {
	redirect,
	type Handle,
	type HandleServerError,
	type RequestEvent,
	type ServerInit
} from '@sveltejs/kit';
import { randomBytes } from 'node:crypto';
import { provide } from '$server/lifecycle';
import { startSync } from '$server/sync';
import { sessionFromCookie } from '$lib/server/auth/sessions';
import { startSweeping } from '$lib/server/auth/sweep';
import { pool } from '$lib/server/db';
import { closeEngine } from '$lib/server/engine/evaluate';
import { log } from '$lib/server/log';
import { startMail, stopMail } from '$lib/server/mail/queue';
import { Problem, problemResponse } from '$lib/server/problems';
import { settings } from '$lib/server/settings';

export const init: ServerInit = async () => {
	settings();
	await startMail();
	await startSync();
	startSweeping();
	provide('close', async () => {
		await stopMail();
		await closeEngine();
		await pool.end();
	});
};

export const handle: Handle = async ({ event, resolve }) => {
	const found = await sessionFromCookie(event.request.headers.get('cookie'));
	event.locals.person = found?.person ?? null;
	event.locals.sessionId = found?.sessionId ?? null;

	const asksApi = isApi(event);
	// Programs ask with a token, which each route reads; a cookie counts for nothing there.
	if (event.url.pathname.startsWith('/api/v1/')) {
		event.locals.person = event.locals.sessionId = null;
	} else if (asksApi) {
		const problem = forgedElsewhere(event) ?? (found ? null : notSignedIn);
		if (problem) return problemResponse(problem);
	} else if (!found && event.route.id?.startsWith('/(app)')) {
		const to = event.url.pathname + event.url.search;
		redirect(303, to === '/' ? '/sign-in' : `/sign-in?to=${encodeURIComponent(to)}`);
	}

	const response = told(await resolve(event), event.locals.problem, asksApi);
	// Links with a secret in their path are told to no other site, and no file is run as another kind.
	response.headers.set('referrer-policy', 'same-origin');
	response.headers.set('x-content-type-options', 'nosniff');
	return response;
};

const isApi = ({ url }: { url: URL }) => url.pathname.startsWith('/api/');

/** SvelteKit knows no status for a Problem and answers 500. */
function told(response: Response, problem: Problem | undefined, isApi: boolean): Response {
	// SvelteKit answers this one itself, in plain words.
	if (isApi && !problem && response.status === 405) {
		const allow = response.headers.get('allow') ?? '';
		return problemResponse(new Problem(405, `This address is asked by ${allow}.`, {}, { allow }));
	}
	if (!problem) return response;
	if (isApi) return problemResponse(problem);
	const { body, status, headers } = response;
	return new Response(body, { status: status === 500 ? problem.status : status, headers });
}

const notSignedIn = new Problem(401, 'You are not signed in, or no longer.');

/**
 * SvelteKit refuses forms posted from other sites; this refuses the rest of what changes something, so
 * that a page elsewhere in the same registrable domain cannot use a person's cookie either.
 */
function forgedElsewhere({ request, url }: RequestEvent): Problem | null {
	if (request.method === 'GET' || request.method === 'HEAD') return null;
	const origin = request.headers.get('origin');
	if (origin === null || origin === url.origin) return null;
	return new Problem(403, `Requests that change something are not taken from ${origin}.`);
}

export const handleError: HandleServerError = ({ error, event, status, message }) => {
	if (error instanceof Problem) {
		event.locals.problem = error;
		return { message: error.message, status: error.status };
	}
	if (status < 500) {
		const isMissing = status === 404;
		if (isApi(event))
			event.locals.problem = isMissing
				? new Problem(404, 'There is nothing at this address.')
				: new Problem(400, 'The request cannot be read.');
		return { message: isMissing ? 'There is no page at this address.' : message, status };
	}
	const reference = randomBytes(4).toString('hex');
	// The route and not the path, which may hold the secret of a link.
	log.error({ error, reference, route: event.route.id }, 'A request failed');
	const words = 'Something went wrong here.';
	if (isApi(event)) event.locals.problem = new Problem(500, words, { reference });
	return { message: words, status, reference };
};
