import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { askForReset, resetFor, setPassword } from '$lib/server/auth/resets';
import { sessionFromCookie } from '$lib/server/auth/sessions';
import { signIn } from '$lib/server/auth/sign-in';
import { db } from '$lib/server/db';
import { passwordReset } from '$lib/server/db/schema';
import { cookieOf, makePerson, PASSWORD } from './fixtures';
import { tokenMailedTo, mailsTo } from './mailed';

const NEW = 'seven braids in the wind';

async function resetMailed() {
	const person = await makePerson();
	await askForReset(person.email, person.email);
	return { person, token: await tokenMailedTo(person.email, 'reset') };
}

test('a link by mail sets a new password and signs in', async () => {
	const { person, token } = await resetMailed();
	expect(await resetFor(token)).toMatchObject({ userId: person.id });
	const { name, value } = await setPassword(token, NEW);
	expect((await sessionFromCookie(`${name}=${value}`))?.person.id).toBe(person.id);
	expect((await signIn(person.email, PASSWORD, '192.0.2.1')).outcome).toBe('refused');
	expect((await signIn(person.email, NEW, '192.0.2.1')).outcome).toBe('in');
});

test('a link works once, also when it is used twice at the same moment', async () => {
	const { token } = await resetMailed();
	const both = await Promise.allSettled([setPassword(token, NEW), setPassword(token, NEW)]);
	expect(both.map((one) => one.status).sort()).toEqual(['fulfilled', 'rejected']);
	expect(await resetFor(token)).toBeNull();
	await expect(setPassword(token, NEW)).rejects.toMatchObject({ status: 409 });
});

test('a new password ends every session that there was', async () => {
	const { person, token } = await resetMailed();
	const old = await cookieOf(person);
	await setPassword(token, NEW);
	expect(await sessionFromCookie(old)).toBeNull();
});

test('a link lapses after thirty minutes', async () => {
	const { person, token } = await resetMailed();
	const [row] = await db.select().from(passwordReset).where(eq(passwordReset.userId, person.id));
	expect(row!.expiresAt.getTime() - row!.createdAt.getTime()).toBeLessThan(30 * 60_000 + 1000);
	await db
		.update(passwordReset)
		.set({ expiresAt: new Date(Date.now() - 1) })
		.where(eq(passwordReset.userId, person.id));
	expect(await resetFor(token)).toBeNull();
	await expect(setPassword(token, NEW)).rejects.toMatchObject({ status: 409 });
});

test('the database does not hold what the link holds', async () => {
	const { person, token } = await resetMailed();
	const [row] = await db.select().from(passwordReset).where(eq(passwordReset.userId, person.id));
	expect(JSON.stringify(row)).not.toContain(token);
});

test('a new password ends the wait after too many tries', async () => {
	const { person, token } = await resetMailed();
	for (let n = 0; n < 5; n++) await signIn(person.email, 'not the password', `192.0.2.${n}`);
	await setPassword(token, NEW);
	expect((await signIn(person.email, NEW, '192.0.2.9')).outcome).toBe('in');
});

test('asking twice within five minutes sends one mail', async () => {
	const { person } = await resetMailed();
	await askForReset(person.email, '192.0.2.77');
	const other = await makePerson();
	await askForReset(other.email, '192.0.2.77');
	await tokenMailedTo(other.email, 'reset');
	expect(await mailsTo(person.email)).toHaveLength(1);
});

test('an address without an account is answered alike and gets no mail', async () => {
	await expect(askForReset('nobody@halden.example', '192.0.2.78')).resolves.toBeUndefined();
	const other = await makePerson();
	await askForReset(other.email, '192.0.2.78');
	await tokenMailedTo(other.email, 'reset');
	expect(await mailsTo('nobody@halden.example')).toEqual([]);
});

test('a network that asks for many links is stopped', async () => {
	const asks = Array.from({ length: 20 }, (_, n) =>
		askForReset(`many${n}@halden.example`, '192.0.2.79')
	);
	await Promise.all(asks);
	await expect(askForReset('more@halden.example', '192.0.2.79')).rejects.toMatchObject({
		status: 429
	});
});
