/** What a program may send that is wrong, against the build as it runs: each is told in words. */
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { makePerson } from '../server/fixtures';
import '../server/setup';
import { serve, type Served } from '../setup/serve';

const { db } = await import('$lib/server/db');
const { apiToken } = await import('$lib/server/db/schema');
const { apiTokensOf, makeApiToken, revokeApiToken } = await import('$lib/server/auth/api-tokens');

let site: Served;
let token: string;

const newToken = async (scope: 'read' | 'evaluate' = 'evaluate') => {
	const person = await makePerson();
	const made = await makeApiToken(person.id, { name: 'script', scope, days: 1 });
	const [row] = await apiTokensOf(person.id);
	return { personId: person.id, id: row!.id, token: made };
};

beforeAll(async () => {
	site = await serve({
		DATABASE_URL: process.env.DATABASE_URL!,
		SMTP_URL: process.env.SMTP_URL!,
		...inject('store')
	});
	({ token } = await newToken());
});
afterAll(() => site.stop());

type Asked = { method?: string; body?: string; token?: string; kind?: string };

async function ask(path: string, asked: Asked = {}) {
	const { body, method = body === undefined ? 'GET' : 'POST', kind = 'application/json' } = asked;
	const headers: Record<string, string> = { authorization: `Bearer ${asked.token ?? token}` };
	if (body !== undefined) headers['content-type'] = kind;
	return fetch(`${site.origin}/api/v1/${path}`, { method, headers, body });
}

/** Holds the answer to be a problem in words, and gives it. */
async function problem(answer: Response, status: number) {
	const text = await answer.text();
	expect([answer.status, text.slice(0, 300)]).toEqual([status, expect.stringContaining('detail')]);
	expect(answer.headers.get('content-type')).toBe('application/problem+json');
	const told = JSON.parse(text);
	expect(told).toMatchObject({ type: 'about:blank', status });
	expect(told.title).toMatch(/^[A-Z]\w+/);
	expect(told.detail).toMatch(/^\S[^]* [^]*[.?]$/);
	expect(text).not.toMatch(/NaN|Infinity|node_modules|at \w+ \(/);
	return told as { detail: string; faults?: { path: string }[]; errors?: { field: string }[] };
}

const LINE = 'methods/uniform-line';
const steel = { site: { kind: 'body', body: 'earth' }, density: 7900, stress: 5e9 };
const with_ = (more: object) => JSON.stringify({ ...steel, ...more });
const nested = (depth: number) => '['.repeat(depth) + ']'.repeat(depth);
const noteOf = (items: string) =>
	`{"format":"holdfast-note","version":1,"thinLimit":"","items":${items}}`;

test.each([
	['a body of 5 MB', { body: JSON.stringify({ a: 'x'.repeat(5e6) }) }, 413],
	['a form', { body: 'density=1', kind: 'application/x-www-form-urlencoded' }, 415],
	['plain text', { body: '{}', kind: 'text/plain' }, 415],
	['no JSON', { body: '{"density": NaN}' }, 400],
	['nothing', { body: '' }, 400],
	['a byte order mark and rubbish', { body: '\uFEFF%' }, 400],
	['a list', { body: '[]' }, 422],
	['null', { body: 'null' }, 422],
	['100 000 brackets', { body: nested(100_000) }, 422],
	['brackets inside an input', { body: `{"site":${nested(50_000)}}` }, 422],
	['a field that it does not know', { body: with_({ densitty: 1 }) }, 422],
	['a text for a figure', { body: with_({ density: 'NaN' }) }, 422],
	['1e308', { body: with_({ density: 1e308 }) }, 422],
	['a figure beyond doubles', { body: '{"density":1e999}' }, 422],
	[
		'negative zero',
		{ body: '{"site":{"kind":"body","body":"earth"},"density":-0,"stress":5e9}' },
		422
	],
	['a prototype', { body: '{"__proto__":{"density":1},"constructor":1}' }, 422],
	['the wrong verb', { method: 'DELETE' }, 405]
] as [string, Asked, number][])('a method that is sent %s says so', async (_, asked, status) => {
	await problem(await ask(LINE, asked), status);
});

test('of a key that stands twice the last holds', async () => {
	const twice = with_({}).replace('{', '{"density":"first",');
	expect((await ask(LINE, { body: twice })).status).toBe(200);
});

test('every fault is told with its place', async () => {
	const answer = await ask(LINE, { body: with_({ density: 'NaN', stress: -0, colour: 1 }) });
	const { faults } = await problem(answer, 422);
	expect(faults!.map(({ path }) => path).sort()).toEqual(['colour', 'density', 'stress']);
});

test.each([
	['items that are no list', noteOf('{}'), ['items']],
	['an item of no kind', noteOf('[{"id":"a"}]'), ['items.0.kind']],
	['a hundred brackets', noteOf(nested(100)), ['items.0']],
	[
		'a text that is too long',
		noteOf(JSON.stringify([{ id: 'a', kind: 'section', title: 'x'.repeat(5000) }])),
		['items.0.title']
	]
])('a note with %s is told where', async (_, body, fields) => {
	const { errors } = await problem(await ask('evaluate', { body }), 422);
	expect(errors!.map(({ field }) => field)).toEqual(fields);
});

test.each([
	'9^9^9^9',
	'1e308 * 1e308',
	'0/0',
	'-0',
	'('.repeat(1900) + '1' + ')'.repeat(1900),
	'x = import("fs")',
	'constructor.constructor("return 1")()'
])(
	'a note with %s gets a result or a fault in words, and no figure that is none',
	async (expression) => {
		const item = {
			id: 'a',
			kind: 'calculation',
			symbol: 'x',
			description: '',
			digits: '',
			unit: ''
		};
		const answer = await ask('evaluate', {
			body: noteOf(JSON.stringify([{ ...item, expression }]))
		});
		const text = await answer.text();
		expect(answer.status).toBe(200);
		expect(JSON.parse(text).results[0].outcome.state).toMatch(/^(value|fault)$/);
		expect(text).not.toMatch(/NaN|Infinity|null,"unit"/);
	}
);

test('an address and a method that do not exist are told', async () => {
	await problem(await ask('nothing-here'), 404);
	const { detail } = await problem(await ask('methods/uniform-lin', { body: '{}' }), 404);
	expect(detail).toContain('Is it uniform-line?');
	await problem(await ask(`methods/${'x'.repeat(3000)}`, { body: '{}' }), 404);
	await problem(await ask('methods/__proto__', { body: '{}' }), 404);
	await problem(await ask('methods/%E0%A4', { body: '{}' }), 400);
});

test('wrong, revoked, expired tokens and a scope that is missing are told', async () => {
	const revoked = await newToken();
	await revokeApiToken(revoked.personId, revoked.id);
	const lapsed = await newToken();
	await db
		.update(apiToken)
		.set({ expiresAt: new Date(0) })
		.where(eq(apiToken.id, lapsed.id));
	for (const wrong of ['', 'x', 'holdfast_' + 'x'.repeat(43), revoked.token, lapsed.token]) {
		const answer = await ask('methods', { token: wrong });
		await problem(answer, 401);
		expect(answer.headers.get('www-authenticate')).toBe('Bearer');
	}
	const reading = await newToken('read');
	await problem(await ask(LINE, { token: reading.token, body: with_({}) }), 403);
});

test('a token that asks too often is told how long to wait', async () => {
	const eager = await newToken('read');
	const answers = await Promise.all(
		Array.from({ length: 125 }, () => ask('schemas/note', { token: eager.token }))
	);
	const refused = answers.filter(({ status }) => status !== 200);
	expect(refused).toHaveLength(5);
	for (const answer of refused) {
		await problem(answer, 429);
		expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(0);
	}
});

test('two studies that take too long end with their threads, and the next question is answered', async () => {
	const input = {
		...{ site: steel.site, density: 1300, allowable: 100e9, factorOfSafety: 2 },
		...{ base: { kind: 'lift', lift: 20_000 }, top: 1.06e8 },
		sections: { kind: 'heights', count: 20_000 }
	};
	const study = JSON.stringify({
		...{ method: 'stepped-line', input, outputs: ['lineMass'], samples: 1_000_000 },
		uncertain: [{ path: 'density', distribution: { kind: 'normal', mean: 1300, u: 13 } }]
	});
	const two = [1, 2].map(() => ask('methods/monte-carlo', { body: study }));
	for (const answer of await Promise.all(two)) {
		const { detail } = await problem(answer, 422);
		expect(detail).toMatch(/^The method could not be computed within (10 s|256 MB of memory)\.$/);
	}
	expect((await ask(LINE, { body: with_({}) })).status).toBe(200);
});

test('nothing of all this is in the log', () => {
	const lines = site.output().split('\n').slice(1).filter(Boolean);
	expect(lines).toEqual([]);
});
