/** Accounts of the site: what their owner and the administrator do with them. */
import { asc, eq, sql } from 'drizzle-orm';
import { forget, signInsOfAccount, take } from '../auth/limits';
import { hashPassword, verifyPassword } from '../auth/passwords';
import { endSession, endSessions, type SessionCookie } from '../auth/sessions';
import { db } from '../db';
import { membership, programme, user } from '../db/schema';
import { announce } from '../events';
import { Problem } from '../problems';

/** Every account with the programmes it is in, for the administrator. */
export function listAccounts() {
	return db
		.select({
			id: user.id,
			name: user.name,
			email: user.email,
			isAdministrator: user.isAdministrator,
			lastHereAt: user.lastHereAt,
			programmes: sql<string[]>`coalesce(array_agg(${programme.code} || ' ' || ${membership.role}
				order by ${programme.code}) filter (where ${programme.code} is not null), '{}')`
		})
		.from(user)
		.leftJoin(membership, eq(membership.userId, user.id))
		.leftJoin(programme, eq(programme.id, membership.programmeId))
		.groupBy(user.id)
		.orderBy(asc(user.name));
}

export async function rename(userId: string, name: string): Promise<void> {
	await db.update(user).set({ name }).where(eq(user.id, userId));
}

/**
 * Changes the password of somebody who knows the old one; every other session ends. Wrong tries count
 * as at sign-in: a session left open at a desk gives no more guesses than the door.
 */
export async function changePassword(
	person: { id: string; email: string },
	sessionId: string,
	passwords: { old: string; new: string }
): Promise<void> {
	const userId = person.id;
	if ((await take(signInsOfAccount, person.email)).until)
		throw new Problem(429, 'Too many tries; wait for 15 minutes.');
	const [found] = await db.select().from(user).where(eq(user.id, userId));
	if (!(await verifyPassword(found?.passwordHash ?? null, passwords.old)))
		throw new Problem(403, 'This is not your present password.');
	await forget(signInsOfAccount, person.email);
	const passwordHash = await hashPassword(passwords.new);
	await db.transaction(async (tx) => {
		await tx.update(user).set({ passwordHash }).where(eq(user.id, userId));
		await endSessions(tx, userId, sessionId);
		await announce(tx, { kind: 'access', userId });
	});
}

/** Ends this session and closes its sockets. */
export async function signOut(userId: string, sessionId: string): Promise<SessionCookie> {
	const cookie = await endSession(sessionId);
	await announce(db, { kind: 'access', userId });
	return cookie;
}

/** Ends every session of the person, this one too, and closes their sockets. */
export async function signOutEverywhere(userId: string): Promise<void> {
	await db.transaction(async (tx) => {
		await endSessions(tx, userId);
		await announce(tx, { kind: 'access', userId });
	});
}
