/** A new password by mail: a link that works once, for thirty minutes, and ends every other session. */
import { and, eq, gt, isNull, lt } from 'drizzle-orm';
import { setTimeout as wait } from 'node:timers/promises';
import { db, type Db } from '../db';
import { passwordReset, user } from '../db/schema';
import { announce } from '../events';
import { queueMail } from '../mail/queue';
import { Problem } from '../problems';
import { settings } from '../settings';
import { forget, resetsOfAccount, resetsOfNetwork, signInsOfAccount, take } from './limits';
import { hashPassword } from './passwords';
import { endSessions, startSession, type SessionCookie } from './sessions';
import { digestOf, newToken } from './tokens';

const MINUTES = 30;
/** Longer than a mail takes to be queued: that one was does not show in the time of the answer. */
const LEAST_TIME = 250;

/** Sends a link if there is an account; the answer is the same for every address. */
export async function askForReset(email: string, network: string): Promise<void> {
	const { until } = await take(resetsOfNetwork, network);
	if (until)
		throw new Problem(429, 'Too many links were asked for from this network; try in an hour.');
	await Promise.all([sendLink(email), wait(LEAST_TIME)]);
}

async function sendLink(email: string): Promise<void> {
	if ((await take(resetsOfAccount, email)).until) return;
	const [found] = await db.select().from(user).where(eq(user.email, email));
	if (!found) return;
	await db.transaction(async (tx) => {
		const link = await makeLink(tx, found.id, MINUTES);
		await queueMail(tx, {
			to: found.email,
			subject: 'A new password for Holdfast',
			text: [
				`${found.name},`,
				'somebody, you we hope, asked for a new password for your account. Choose it here:',
				link,
				`The link works once, for ${MINUTES} minutes. Setting a password ends every other session of yours.`,
				'If you did not ask, do nothing: your password stays as it is.'
			].join('\n\n')
		});
	});
}

/** A link on which the person sets a password, for so many minutes. */
export async function makeLink(tx: Db, userId: string, minutes: number): Promise<string> {
	const { token, hash } = newToken();
	const now = Date.now();
	await tx.delete(passwordReset).where(lt(passwordReset.expiresAt, new Date(now - 86_400_000)));
	await tx.insert(passwordReset).values({
		tokenHash: hash,
		userId,
		expiresAt: new Date(now + minutes * 60_000)
	});
	return `${settings().ORIGIN}/reset/${token}`;
}

const isOpen = (token: string) =>
	and(
		eq(passwordReset.tokenHash, digestOf(token)),
		isNull(passwordReset.usedAt),
		gt(passwordReset.expiresAt, new Date())
	);

/** Whom a link is for; null when it has been used, has lapsed or never was. */
export async function resetFor(token: string) {
	const [found] = await db
		.select({ userId: user.id, name: user.name, email: user.email })
		.from(passwordReset)
		.innerJoin(user, eq(user.id, passwordReset.userId))
		.where(isOpen(token));
	return found ?? null;
}

/** Sets the password, uses the link up and signs in. */
export async function setPassword(token: string, password: string): Promise<SessionCookie> {
	const passwordHash = await hashPassword(password);
	const found = await db.transaction(async (tx) => {
		const [used] = await tx
			.update(passwordReset)
			.set({ usedAt: new Date() })
			.where(isOpen(token))
			.returning();
		if (!used)
			throw new Problem(409, 'This link has been used, or it has lapsed. Ask for another.');
		const [person] = await tx
			.update(user)
			.set({ passwordHash })
			.where(eq(user.id, used.userId))
			.returning();
		// Other links that were sent meanwhile open nothing any more.
		await tx
			.update(passwordReset)
			.set({ usedAt: new Date() })
			.where(and(eq(passwordReset.userId, used.userId), isNull(passwordReset.usedAt)));
		await endSessions(tx, used.userId);
		await announce(tx, { kind: 'access', userId: used.userId });
		return person!;
	});
	await forget(signInsOfAccount, found.email);
	return (await startSession(found.id)).cookie;
}
