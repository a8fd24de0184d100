/**
 * Limits that hold before anybody is signed in, counted in the database so that every process counts
 * alike. Keys are digests: the table shows no address of a person or a network.
 */
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { pool } from '../db';
import { digestOf } from './tokens';

const MINUTE = 60;

const limiter = (keyPrefix: string, points: number, duration: number) =>
	new RateLimiterPostgres({
		storeClient: pool,
		storeType: 'pool',
		tableName: 'rate_limit',
		// Made by our migrations; old rows are swept with the sessions.
		tableCreated: true,
		clearExpiredByTimeout: false,
		keyPrefix,
		points,
		duration
	});

/** Tries to sign in to one account, whoever makes them: five in fifteen minutes. */
export const signInsOfAccount = limiter('account', 5, 15 * MINUTE);
/** Tries from one network, whichever accounts they are for; an office may share one address. */
export const signInsOfNetwork = limiter('network', 40, 15 * MINUTE);
/** Links for a new password sent to one address: one in five minutes. */
export const resetsOfAccount = limiter('reset', 1, 5 * MINUTE);
export const resetsOfNetwork = limiter('reset-network', 20, 60 * MINUTE);
/** Links of invitations and resets opened from one network: guessing one is hopeless, and stays so. */
export const linksOfNetwork = limiter('link', 120, 15 * MINUTE);

/** Questions of one token to the API: 120 a minute. */
export const questionsOfToken = limiter('token', 120, MINUTE);
/** Tokens that open nothing, from one network. */
export const wrongTokensOfNetwork = limiter('token-network', 60, 15 * MINUTE);

export type Taken = { left: number; until: null } | { left: 0; until: Date };

/** Counts one try; `until` says when the next is taken where this one was too many. */
export async function take(limit: RateLimiterPostgres, key: string): Promise<Taken> {
	try {
		const { remainingPoints } = await limit.consume(digestOf(key));
		return { left: remainingPoints, until: null };
	} catch (refused) {
		if (!(refused instanceof RateLimiterRes)) throw refused;
		return { left: 0, until: new Date(Date.now() + refused.msBeforeNext) };
	}
}

/** Starts the wait now, in full length. */
export async function close(limit: RateLimiterPostgres, key: string): Promise<Date> {
	const { msBeforeNext } = await limit.block(digestOf(key), limit.duration);
	return new Date(Date.now() + msBeforeNext);
}

/** Gives back a try that turned out well. */
export async function giveBack(limit: RateLimiterPostgres, key: string): Promise<void> {
	await limit.reward(digestOf(key));
}

export async function forget(limit: RateLimiterPostgres, key: string): Promise<void> {
	await limit.delete(digestOf(key));
}
