/**
 * Every route × everybody who may ask. The table is typed here from the description of the roles, not
 * from the code; a route that is not in it, or that is gone, fails.
 */
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { SignedIn } from '$lib/server/auth/sessions';
import { db } from '$lib/server/db';
import { evidenceFile } from '$lib/server/db/schema';
import { freeze } from '$lib/server/baselines/freeze';
import { closeEngine } from '$lib/server/engine/evaluate';
import { storeEvidence } from '$lib/server/evidence/evidence';
import type { Bytes } from '$lib/server/evidence/store';
import { pinRemark } from '$lib/server/remarks/pin';
import { cookieOf, makeGate, makePerson, makeProgramme } from './fixtures';
import { everyEntry, statusOf, type Entry } from './routes';
import { writtenNote } from './written-note';

const ASKERS = [
	...['nobody', 'stranger', 'administrator'],
	...['observer', 'reviewer', 'engineer', 'lead']
] as const;

// In the order of ASKERS. "+": not refused, whatever becomes of an empty request.
const PUBLIC = '+   +   +   +   +   +   +';
const PERSON = '303 +   +   +   +   +   +';
// Signing out leads to the same page as not being signed in.
const LEAVE = ' 303 303 303 303 303 303 303';
const ACCEPT = '401 +   +   +   +   +   +';
const SITE = '  303 403 +   403 403 403 403';
const READ = '  303 404 404 +   +   +   +';
const WRITE = ' 303 404 404 403 403 +   +';
const LEAD = '  303 404 404 403 403 403 +';
const API_PERSON = '401 +   +   +   +   +   +';
// Programs ask with a token; a session opens nothing there.
const TOKEN = '     401 401 401 401 401 401 401';
const API_READ = '  401 404 404 +   +   +   +';
const API_REVIEW = '401 404 404 403 +   +   +';
const API_WRITE = ' 401 404 404 403 403 +   +';
const API_LEAD = '  401 404 404 403 403 403 +';

const PROGRAMME = '/programmes/[programme]';
const NOTE = `${PROGRAMME}/notes/[note]`;
const API_NOTE = '/api/notes/[note]';

const EXPECTED: Record<string, string> = {
	'layout /': PUBLIC,
	'load /sign-in': PUBLIC,
	'?/default /sign-in': PUBLIC,
	'?/default /reset': PUBLIC,
	'load /reset/[token]': PUBLIC,
	'?/default /reset/[token]': PUBLIC,
	'load /invitation/[token]': PUBLIC,
	'?/join /invitation/[token]': PUBLIC,
	'?/signIn /invitation/[token]': PUBLIC,
	'?/accept /invitation/[token]': ACCEPT,
	'?/decline /invitation/[token]': PUBLIC,

	'layout /(app)': PERSON,
	'load /': PERSON,
	'load /programmes': PERSON,
	'load /account': PERSON,
	'load /methods': PERSON,
	'load /methods/[name]': PERSON,
	'?/rename /account': PERSON,
	'?/password /account': PERSON,
	'?/makeToken /account': PERSON,
	'?/revokeToken /account': PERSON,
	'?/signOut /account': LEAVE,
	'?/signOutEverywhere /account': LEAVE,
	'GET /api/today': API_PERSON,
	'POST /api/methods/[name]': API_PERSON,
	'GET /api/v1/methods': TOKEN,
	'GET /api/v1/methods/[name]': TOKEN,
	'POST /api/v1/methods/[name]': TOKEN,
	'POST /api/v1/evaluate': TOKEN,
	'GET /api/v1/schemas/note': TOKEN,
	'GET /api/v1/openapi.json': PUBLIC,

	'load /administration': SITE,
	'?/create /administration': SITE,

	[`layout /(app)${PROGRAMME}`]: READ,
	[`load ${PROGRAMME}`]: READ,
	[`?/create ${PROGRAMME}`]: WRITE,
	[`load ${PROGRAMME}/people`]: READ,
	[`?/invite ${PROGRAMME}/people`]: LEAD,
	[`?/again ${PROGRAMME}/people`]: LEAD,
	[`?/withdraw ${PROGRAMME}/people`]: LEAD,
	[`?/change ${PROGRAMME}/people`]: LEAD,
	[`?/remove ${PROGRAMME}/people`]: LEAD,
	[`load ${PROGRAMME}/gates`]: READ,
	[`?/add ${PROGRAMME}/gates`]: LEAD,
	[`?/change ${PROGRAMME}/gates`]: LEAD,
	[`?/move ${PROGRAMME}/gates`]: LEAD,
	[`?/remove ${PROGRAMME}/gates`]: LEAD,
	[`?/head ${PROGRAMME}/gates`]: LEAD,
	[`load ${PROGRAMME}/baselines`]: READ,
	[`load ${PROGRAMME}/baselines/[baseline]`]: READ,
	[`load ${PROGRAMME}/parameters`]: READ,
	'GET /api/programmes/[programme]/notes': API_READ,
	'GET /api/programmes/[programme]/notes.csv': API_READ,
	'GET /api/programmes/[programme]/parameters.csv': API_READ,

	[`load ${NOTE}`]: READ,
	[`?/titleBlock ${NOTE}`]: WRITE,
	[`load ${NOTE}/compare`]: READ,
	[`load ${NOTE}/freeze`]: LEAD,
	[`?/default ${NOTE}/freeze`]: LEAD,
	[`GET ${API_NOTE}/items`]: API_READ,
	[`GET ${API_NOTE}/movements`]: API_READ,
	[`GET ${API_NOTE}/remarks`]: API_READ,
	[`POST ${API_NOTE}/remarks`]: API_REVIEW,
	[`GET ${API_NOTE}/baselines`]: API_READ,
	[`POST ${API_NOTE}/baselines`]: API_LEAD,
	[`GET ${API_NOTE}/baselines/latest`]: API_READ,
	[`GET ${API_NOTE}/compare`]: API_READ,
	[`GET ${API_NOTE}/parameters`]: API_READ,
	[`POST ${API_NOTE}/evidence`]: API_WRITE,

	'POST /api/remarks/[remark]/replies': API_REVIEW,
	'PUT /api/remarks/[remark]/settled': API_REVIEW,
	'GET /api/evidence/[file]': API_READ,
	'DELETE /api/evidence/[file]': API_WRITE,
	'GET /api/baselines/[baseline]': API_READ,
	'GET /api/baselines/[baseline]/quantities': API_READ,
	'POST /api/baselines/[baseline]/verify': API_READ
};

const entries = await everyEntry();

type Asker = (typeof ASKERS)[number];
let people: Record<Exclude<Asker, 'nobody'>, SignedIn>;
let params: Record<string, string>;
let noteNumber: string;

beforeAll(async () => {
	const { programme, ...members } = await makeProgramme();
	const stranger = await makePerson();
	// Somebody who leads elsewhere has no more to say here than anybody else.
	await makeProgramme({ lead: stranger });
	people = { ...members, stranger, administrator: await makePerson({ isAdministrator: true }) };
	const at = await makeGate(programme.id);
	const items = [{ kind: 'given', id: 'a', symbol: 'a', value: '1', unit: 'm' }] as const;
	const note = await writtenNote(programme.id, members.engineer, [...items]);
	const input = { gateId: at.id, revision: note.revision, seenSeq: note.seq, waivers: [] };
	const baseline = await freeze({ note, programme, person: members.lead, input });
	const remark = await pinRemark({
		...{ note, programme, person: members.reviewer },
		...{ itemId: 'a', body: 'Why?' }
	});
	params = {
		...{ programme: programme.code, note: note.id, baseline, remark },
		name: 'uniform-line',
		token: 'a-token-that-opens-nothing'
	};
	noteNumber = note.number;
});
afterAll(closeEngine);

/** A file each time: the one who may remove it does. */
async function freshFile(): Promise<string> {
	const body = new Blob(['specimen, batch, value']).stream() as unknown as Bytes;
	const upload = { noteId: params.note!, userId: people.engineer.id, name: 'coupons.csv', body };
	await storeEvidence(upload);
	const rows = await db.select().from(evidenceFile);
	return rows.at(-1)!.id;
}

test('every route has an entry in the table, and every entry a route', () => {
	expect(entries.map((entry) => entry.name).sort()).toEqual(Object.keys(EXPECTED).sort());
});

/** "+" for an answer that is neither a refusal nor a failure, else its status. */
async function answerTo(asker: Asker, entry: Entry, refusals: Set<string>): Promise<string> {
	const status = await statusOf(entry, {
		params: {
			...params,
			// Pages name a note by its number, the API by its id.
			note: entry.id.startsWith('/api') ? params.note! : noteNumber,
			file: entry.id.includes('[file]') ? await freshFile() : ''
		},
		cookie: asker === 'nobody' ? null : await cookieOf(people[asker]),
		query: entry.id.endsWith('/compare') ? '?from=A&to=now' : undefined
	});
	return status >= 500 || refusals.has(String(status)) ? String(status) : '+';
}

test.each(entries)('$name is open to whom it should be, and to nobody else', async (entry) => {
	const expected = EXPECTED[entry.name]!.trim().split(/\s+/);
	// Being sent to sign in is a refusal where one is expected, and a way on after a form elsewhere.
	const refusals = new Set(['401', '403', '404', ...expected]);
	const answers = [];
	for (const asker of ASKERS) answers.push(await answerTo(asker, entry, refusals));
	expect(answers).toEqual(expected);
});
