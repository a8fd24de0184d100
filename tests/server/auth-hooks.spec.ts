import { isRedirect, type RequestEvent } from '@sveltejs/kit';
import { expect, test } from 'vitest';
import { Problem } from '$lib/server/problems';
import { handle, handleError } from '../../src/hooks.server';
import { load as signInLoad } from '../../src/routes/(public)/sign-in/+page.server';
import { cookieOf, makePerson } from './fixtures';

const ORIGIN = 'http://127.0.0.1:4173';

async function event(path: string, init: RequestInit = {}, routeId = '/api') {
	const url = new URL(path, ORIGIN);
	return {
		request: new Request(url, init),
		url,
		route: { id: routeId },
		locals: { person: null, sessionId: null }
	} as unknown as RequestEvent;
}

const signedIn = async (headers: Record<string, string> = {}) => ({
	headers: { ...headers, cookie: await cookieOf(await makePerson()) }
});

test('a request of another site that would change something is refused, whatever its cookie', async () => {
	const init = { method: 'POST', ...(await signedIn({ origin: 'https://elsewhere.example' })) };
	const response = await handle({
		event: await event('/api/notes/x/remarks', init),
		resolve: () => {
			throw new Error('the route was reached');
		}
	});
	expect(response.status).toBe(403);
	expect(response.headers.get('content-type')).toBe('application/problem+json');
});

test('a Problem from the API is a problem document with its details', async () => {
	const asked = await event('/api/x', await signedIn());
	const response = await handle({
		event: asked,
		resolve: async () => {
			const error = new Problem(422, 'Two checks fail.', { inTheWay: ['4.2', '4.3'] });
			await handleError({ error, event: asked, status: 500, message: 'Internal Error' });
			return new Response('{}', { status: 500 });
		}
	});
	expect(response.status).toBe(422);
	expect(await response.json()).toMatchObject({
		title: 'Something is to be put right',
		detail: 'Two checks fail.',
		inTheWay: ['4.2', '4.3']
	});
});

test('an unexpected failure is told with a reference and nothing of what it was', async () => {
	const error = new Error('password=hunter2 at db:5432');
	const told = await handleError({
		error,
		event: await event('/programmes/CL'),
		status: 500,
		message: 'Internal Error'
	});
	expect(told).toEqual({
		message: 'Something went wrong here.',
		status: 500,
		reference: expect.stringMatching(/^[0-9a-f]{8}$/)
	});
});

test.each([
	['/programmes/CL/people', '/programmes/CL/people'],
	['//elsewhere.example', '/'],
	['/\\elsewhere.example', '/'],
	['https://elsewhere.example', '/'],
	['javascript:alert(1)', '/']
])('after signing in, "%s" leads to %s', async (to, location) => {
	const url = new URL(`/sign-in?to=${encodeURIComponent(to)}`, ORIGIN);
	const asked = { url, locals: { person: await makePerson() } };
	try {
		await signInLoad(asked as never);
		expect.unreachable();
	} catch (thrown) {
		if (!isRedirect(thrown)) throw thrown;
		expect(thrown.location).toBe(location);
	}
});

test('a page asked for without a session is asked for again after signing in', async () => {
	const asked = await event('/programmes/CL?new', {}, '/(app)/programmes/[programme]');
	const refused = handle({ event: asked, resolve: () => new Response() });
	await expect(refused).rejects.toMatchObject({
		status: 303,
		location: '/sign-in?to=%2Fprogrammes%2FCL%3Fnew'
	});
});
