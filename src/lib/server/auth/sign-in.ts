/**
 * Signing in with address and password. Whether an account exists shows neither in the answer nor in
 * its time: a try at an address without an account is hashed and counted like any other.
 */
import { eq } from 'drizzle-orm';
import { z } from 'zod';
import { db } from '../db';
import { user } from '../db/schema';
import { close, forget, giveBack, signInsOfAccount, signInsOfNetwork, take } from './limits';
import { verifyPassword } from './passwords';
import { startSession, type SessionCookie } from './sessions';

/** An address as it is typed; accounts keep it in lower case. */
export const addressSchema = z
	.string()
	.trim()
	.toLowerCase()
	.max(254, 'An address has at most 254 characters.')
	.pipe(z.email('An address has an @ and a domain with a dot, as in person@halden.example.'));

export type SignInAnswer =
	| { outcome: 'in'; userId: string; cookie: SessionCookie }
	| { outcome: 'refused'; triesLeft: number }
	| { outcome: 'waits'; until: Date };

/** `network` is the address that the request came from. */
export async function signIn(
	email: string,
	password: string,
	network: string
): Promise<SignInAnswer> {
	const fromNetwork = await take(signInsOfNetwork, network);
	if (fromNetwork.until) return { outcome: 'waits', until: fromNetwork.until };
	const atAccount = await take(signInsOfAccount, email);
	if (atAccount.until) return { outcome: 'waits', until: atAccount.until };

	const [found] = await db.select().from(user).where(eq(user.email, email));
	if (await verifyPassword(found?.passwordHash ?? null, password)) {
		await forget(signInsOfAccount, email);
		await giveBack(signInsOfNetwork, network);
		const { cookie } = await startSession(found!.id);
		return { outcome: 'in', userId: found!.id, cookie };
	}
	if (atAccount.left > 0) return { outcome: 'refused', triesLeft: atAccount.left };
	return { outcome: 'waits', until: await close(signInsOfAccount, email) };
}
