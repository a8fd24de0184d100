/** Tokens with which programs ask the API for their owner: made, listed, revoked, and read from a request. */
import { and, asc, eq, gt, isNull, lt, or } from 'drizzle-orm';
import { z } from 'zod';
import { db } from '../db';
import { apiToken, tokenScope, user } from '../db/schema';
import { Problem } from '../problems';
import { questionsOfToken, take, wrongTokensOfNetwork } from './limits';
import { mayWithToken, type ApiAction } from './permissions';
import { digestOf, newToken } from './tokens';

const DAY = 86_400_000;
const MOST = 20;
/** Tells in a log or a search what a string is. */
const MARK = 'holdfast_';

export const newApiTokenSchema = z.object({
	name: z
		.string()
		.trim()
		.min(1, 'Say what the token is for, so that you know it again.')
		.max(80, 'A name has at most 80 characters.'),
	scope: z.enum(tokenScope.enumValues),
	/** Days for which it holds; empty for no end. */
	days: z
		.union([z.literal(''), z.coerce.number().int().min(1).max(3650)], {
			error: 'A whole number of days, 1 to 3650, or nothing.'
		})
		.default('')
});

/** The token itself: this is the one time that anybody sees it. */
export async function makeApiToken(
	userId: string,
	{ name, scope, days }: z.infer<typeof newApiTokenSchema>
): Promise<string> {
	const held = await db.$count(apiToken, and(eq(apiToken.userId, userId), holds()));
	if (held >= MOST)
		throw new Problem(409, `You have ${MOST} tokens; revoke one that is no longer used.`);
	const token = MARK + newToken().token;
	await db.insert(apiToken).values({
		userId,
		name,
		scope,
		tokenHash: digestOf(token),
		begins: token.slice(0, MARK.length + 4),
		expiresAt: days === '' ? null : new Date(Date.now() + days * DAY)
	});
	return token;
}

export type ApiTokenRow = Omit<typeof apiToken.$inferSelect, 'tokenHash' | 'userId'>;

export function apiTokensOf(userId: string): Promise<ApiTokenRow[]> {
	const { id, name, scope, begins, expiresAt, lastUsedAt, createdAt } = apiToken;
	return db
		.select({ id, name, scope, begins, expiresAt, lastUsedAt, createdAt })
		.from(apiToken)
		.where(eq(apiToken.userId, userId))
		.orderBy(asc(createdAt));
}

export async function revokeApiToken(userId: string, id: string): Promise<void> {
	const gone = await db
		.delete(apiToken)
		.where(and(eq(apiToken.id, id), eq(apiToken.userId, userId)))
		.returning({ id: apiToken.id });
	if (gone.length === 0) throw new Problem(404, 'There is no such token of yours.');
}

type Asker = { request: Request; getClientAddress(): string };

const BEARER = /^Bearer ([\w-]{20,200})$/i;

/**
 * Who asks, by the token in the Authorization header. A session's cookie counts for nothing here, so no
 * page elsewhere can ask with it. Missing, unknown, revoked and expired tokens are answered alike.
 */
export async function requireToken(
	{ request, getClientAddress }: Asker,
	action: ApiAction
): Promise<{ userId: string }> {
	const token = BEARER.exec(request.headers.get('authorization') ?? '')?.[1];
	const found = token === undefined ? null : await tokenBehind(token);
	if (!found) {
		if (token !== undefined) await within(wrongTokensOfNetwork, getClientAddress());
		throw new Problem(
			401,
			'The API needs a token that holds: Authorization: Bearer … . Make one on your account page.',
			{},
			{ 'www-authenticate': 'Bearer' }
		);
	}
	await within(questionsOfToken, found.id);
	if (!mayWithToken(found.scope, action))
		throw new Problem(
			403,
			`This token has the scope “${found.scope}”, which does not include this.`
		);
	await noteUse(found.id);
	return { userId: found.userId };
}

const holds = () => or(isNull(apiToken.expiresAt), gt(apiToken.expiresAt, new Date()));

async function tokenBehind(token: string) {
	const [found] = await db
		.select({ id: apiToken.id, userId: apiToken.userId, scope: apiToken.scope })
		.from(apiToken)
		.innerJoin(user, eq(user.id, apiToken.userId))
		.where(and(eq(apiToken.tokenHash, digestOf(token)), holds()));
	return found ?? null;
}

async function within(limit: typeof questionsOfToken, key: string): Promise<void> {
	const { until } = await take(limit, key);
	if (!until) return;
	const seconds = Math.max(1, Math.ceil((until.getTime() - Date.now()) / 1000));
	throw new Problem(
		429,
		`Too many questions; the next is taken in ${seconds} s.`,
		{},
		{ 'retry-after': `${seconds}` }
	);
}

async function noteUse(id: string): Promise<void> {
	const aMinuteAgo = new Date(Date.now() - 60_000);
	await db
		.update(apiToken)
		.set({ lastUsedAt: new Date() })
		.where(
			and(eq(apiToken.id, id), or(isNull(apiToken.lastUsedAt), lt(apiToken.lastUsedAt, aMinuteAgo)))
		);
}
