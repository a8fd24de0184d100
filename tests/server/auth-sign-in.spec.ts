import { eq } from 'drizzle-orm';
import { performance } from 'node:perf_hooks';
import { expect, test } from 'vitest';
import { hashPassword } from '$lib/server/auth/passwords';
import { sessionFromCookie } from '$lib/server/auth/sessions';
import { signIn } from '$lib/server/auth/sign-in';
import { db } from '$lib/server/db';
import { rateLimit, user } from '$lib/server/db/schema';
import { cookieOf, makePerson, PASSWORD } from './fixtures';

let network = 0;
/** A network that nobody has tried from. */
const fresh = () => `192.0.2.${++network}`;

test('the right password signs in', async () => {
	const person = await makePerson();
	const answer = await signIn(person.email, PASSWORD, fresh());
	if (answer.outcome !== 'in') throw new Error(answer.outcome);
	const { name, value } = answer.cookie;
	expect((await sessionFromCookie(`${name}=${value}`))?.person.id).toBe(person.id);
});

test('passwords are hashed with argon2id at 19 MiB, two passes and one lane', async () => {
	// OWASP Password Storage Cheat Sheet, least parameters (from memory).
	expect(await hashPassword('a tape of many strands')).toMatch(
		/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/
	);
});

test('a wrong password and an unknown address get one answer, and the tries left', async () => {
	const person = await makePerson();
	for (const email of [person.email, 'nobody@halden.example']) {
		const answers = [];
		for (let n = 0; n < 4; n++) answers.push(await signIn(email, 'not the password', fresh()));
		expect(answers).toEqual([4, 3, 2, 1].map((triesLeft) => ({ outcome: 'refused', triesLeft })));
	}
});

test('a wrong password and an unknown address take the same time', async () => {
	const timeOf = async (email: string) => {
		const start = performance.now();
		await signIn(email, 'not the password', fresh());
		return performance.now() - start;
	};
	const withAccount: number[] = [];
	const without: number[] = [];
	// By turns, and the quickest of each: what else the machine does meanwhile falls out.
	for (let n = 0; n < 12; n++) {
		const { id, email } = await makePerson();
		await db
			.update(user)
			.set({ passwordHash: await hashPassword(PASSWORD) })
			.where(eq(user.id, id));
		withAccount.push(await timeOf(email));
		without.push(await timeOf(`none${n}@halden.example`));
	}
	const ratio = Math.min(...without) / Math.min(...withAccount);
	// One hash takes tens of milliseconds; without it the answer would come in a tenth of the time.
	expect(ratio).toBeGreaterThan(0.5);
	expect(ratio).toBeLessThan(2);
});

test('after five wrong tries the account waits fifteen minutes, even for the right password', async () => {
	const person = await makePerson();
	for (let n = 0; n < 4; n++) await signIn(person.email, 'not the password', fresh());
	const fifth = await signIn(person.email, 'not the password', fresh());
	if (fifth.outcome !== 'waits') throw new Error(fifth.outcome);
	const minutes = (fifth.until.getTime() - Date.now()) / 60_000;
	expect(minutes).toBeGreaterThan(14.9);
	expect(minutes).toBeLessThanOrEqual(15);
	expect((await signIn(person.email, PASSWORD, fresh())).outcome).toBe('waits');
});

test('tries at an account leave its own sessions undisturbed', async () => {
	const person = await makePerson();
	const cookie = await cookieOf(person);
	for (let n = 0; n < 6; n++) await signIn(person.email, 'not the password', fresh());
	expect(await sessionFromCookie(cookie)).not.toBeNull();
});

test('a right password in between starts the count again', async () => {
	const person = await makePerson();
	const from = fresh();
	for (let n = 0; n < 4; n++) await signIn(person.email, 'not the password', from);
	expect((await signIn(person.email, PASSWORD, from)).outcome).toBe('in');
	expect(await signIn(person.email, 'not the password', from)).toMatchObject({ triesLeft: 4 });
});

test('a network that tries many accounts waits, and other networks do not', async () => {
	const from = fresh();
	await db.update(user).set({ passwordHash: await hashPassword('something else') });
	const person = await makePerson();
	const tries = Array.from({ length: 40 }, (_, n) =>
		signIn(`guess${n}@halden.example`, 'not the password', from)
	);
	await Promise.all(tries);
	expect((await signIn(person.email, PASSWORD, from)).outcome).toBe('waits');
	expect((await signIn(person.email, PASSWORD, fresh())).outcome).toBe('in');
});

test('the counts show no address', async () => {
	await signIn('secret.person@halden.example', 'not the password', '198.51.100.7');
	const keys = (await db.select().from(rateLimit)).map((row) => row.key);
	expect(keys.length).toBeGreaterThan(0);
	for (const key of keys) expect(key).toMatch(/^(account|network):[0-9a-f]{64}$/);
});
