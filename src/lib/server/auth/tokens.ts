/** Secrets sent by mail. Only the digest is stored, so that a copy of the database opens nothing. */
import { createHash, randomBytes } from 'node:crypto';

export const digestOf = (text: string) => createHash('sha256').update(text).digest('hex');

/** 256 bits, and what is stored of them. */
export function newToken(): { token: string; hash: string } {
	const token = randomBytes(32).toString('base64url');
	return { token, hash: digestOf(token) };
}
