/**
 * Hashing of passwords with argon2id, at the least parameters of the OWASP Password Storage Cheat
 * Sheet (19 MiB, two passes, one lane; from memory).
 */
import { hash, verify } from '@node-rs/argon2';
import { randomBytes } from 'node:crypto';

const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export const hashPassword = (password: string) => hash(password, COST);

/** A hash that no password is known to meet. */
export const closedHash = () => hashPassword(randomBytes(32).toString('hex'));

let nobody: Promise<string> | undefined;

/** Takes as long for an account that does not exist (null), so that the time does not tell. */
export async function verifyPassword(
	passwordHash: string | null,
	password: string
): Promise<boolean> {
	const against = passwordHash ?? (await (nobody ??= closedHash()));
	const holds = await verify(against, password);
	return passwordHash !== null && holds;
}
