import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import {
	endSession,
	endSessions,
	sessionFromCookie,
	startSession
} from '$lib/server/auth/sessions';
import { db } from '$lib/server/db';
import { session } from '$lib/server/db/schema';
import { cookieOf, makePerson } from './fixtures';

const HOUR = 3_600_000;

const expiryOf = async (id: string) =>
	(await db.select().from(session).where(eq(session.id, id)))[0]!.expiresAt.getTime();

const shiftExpiry = (id: string, to: number) =>
	db
		.update(session)
		.set({ expiresAt: new Date(to) })
		.where(eq(session.id, id));

test('a session is found by its cookie among others', async () => {
	const person = await makePerson();
	const cookie = await cookieOf(person);
	const found = await sessionFromCookie(`zone=Europe/Oslo; ${cookie}; theme=dark`);
	expect(found?.person).toEqual(person);
});

test.each([null, '', 'holdfast_session=', 'holdfast_session=no-such-session', 'a;;=b; %'])(
	'the Cookie header %j is nobody',
	async (header) => {
		expect(await sessionFromCookie(header)).toBeNull();
	}
);

test('the cookie is out of reach of scripts and of other sites', async () => {
	const { cookie } = await startSession((await makePerson()).id);
	expect(cookie.attributes).toMatchObject({
		httpOnly: true,
		sameSite: 'lax',
		secure: false,
		path: '/'
	});
});

test('a session ends twelve hours after its last use', async () => {
	const person = await makePerson();
	const { sessionId, cookie } = await startSession(person.id);
	const header = `${cookie.name}=${cookie.value}`;
	expect(await expiryOf(sessionId)).toBeGreaterThan(Date.now() + 11.9 * HOUR);

	// Last used one hour ago: using it now gives it twelve hours again.
	await shiftExpiry(sessionId, Date.now() + 11 * HOUR);
	expect(await sessionFromCookie(header)).not.toBeNull();
	expect(await expiryOf(sessionId)).toBeGreaterThan(Date.now() + 11.9 * HOUR);

	await shiftExpiry(sessionId, Date.now() - 1000);
	expect(await sessionFromCookie(header)).toBeNull();
});

test('signing out ends that session only', async () => {
	const person = await makePerson();
	const other = await cookieOf(person);
	const { sessionId, cookie } = await startSession(person.id);
	const blank = await endSession(sessionId);
	expect(blank.value).toBe('');
	expect(await sessionFromCookie(`${cookie.name}=${cookie.value}`)).toBeNull();
	expect(await sessionFromCookie(other)).not.toBeNull();
});

test('ending the other sessions of a person leaves the one named, and those of others', async () => {
	const person = await makePerson();
	const first = await cookieOf(person);
	const somebody = await cookieOf(await makePerson());
	const { sessionId, cookie } = await startSession(person.id);
	await endSessions(db, person.id, sessionId);
	expect(await sessionFromCookie(first)).toBeNull();
	expect(await sessionFromCookie(`${cookie.name}=${cookie.value}`)).not.toBeNull();
	expect(await sessionFromCookie(somebody)).not.toBeNull();
});
