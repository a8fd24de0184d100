/**
 * Sessions: the one module that knows the session library and its cookie.
 *
 * A session ends twelve hours after its last use. Every use within a few minutes counts as one, so that
 * reading a page does not write to the database each time. The cookie itself has no short life: the row
 * decides, because use over the socket prolongs a session and cannot set a cookie.
 */
import { DrizzlePostgreSQLAdapter } from '@lucia-auth/adapter-drizzle';
import { and, eq, ne, sql } from 'drizzle-orm';
import { Lucia, TimeSpan } from 'lucia';
import { db, type Db } from '../db';
import { apiToken, session, user } from '../db/schema';
import { settings } from '../settings';

/** Who is signed in, as routes and the sync server see them. */
export type SignedIn = {
	id: string;
	email: string;
	name: string;
	isAdministrator: boolean;
};

const COOKIE_NAME = 'holdfast_session';
const COOKIE = new RegExp(`(?:^|;\\s*)${COOKIE_NAME}=([a-z0-9]+)`);
const LIFE = new TimeSpan(12, 'h');
/** Use within this many milliseconds of the last is not written down. */
const GRAIN = 5 * 60_000;

const adapter = new DrizzlePostgreSQLAdapter(db, session, user);

const open = () =>
	new Lucia(adapter, {
		sessionExpiresIn: LIFE,
		sessionCookie: {
			name: COOKIE_NAME,
			expires: false,
			attributes: { sameSite: 'lax', secure: settings().ORIGIN.startsWith('https:') }
		},
		getUserAttributes: ({ email, name, isAdministrator }) => ({ email, name, isAdministrator })
	});

let opened: ReturnType<typeof open> | undefined;
/** Opened on first use: a build reads this module without an environment. */
const lucia = () => (opened ??= open());

declare module 'lucia' {
	interface Register {
		Lucia: ReturnType<typeof open>;
		UserId: string;
		DatabaseUserAttributes: Omit<SignedIn, 'id'>;
	}
}

/** The person and session that a Cookie header stands for; null when there is none any more. */
export async function sessionFromCookie(
	cookieHeader: string | null
): Promise<{ person: SignedIn; sessionId: string } | null> {
	// The library's own reader throws on a malformed cookie of somebody else's.
	const sessionId = cookieHeader?.match(COOKIE)?.[1];
	if (!sessionId) return null;
	const found = await lucia().validateSession(sessionId);
	if (!found.session) return null;
	const { id, email, name, isAdministrator } = found.user;
	const expiry = new Date(Date.now() + LIFE.milliseconds());
	if (expiry.getTime() - found.session.expiresAt.getTime() > GRAIN) {
		await adapter.updateSessionExpiration(sessionId, expiry);
		await recordUse(id);
	}
	return { person: { id, email, name, isAdministrator }, sessionId };
}

/** A visit ends when half an hour passes without use. */
async function recordUse(userId: string): Promise<void> {
	const newVisit = sql`${user.lastHereAt} < now() - interval '30 minutes'`;
	await db
		.update(user)
		.set({
			lastVisitEndedAt: sql`case when ${newVisit} then ${user.lastHereAt} else ${user.lastVisitEndedAt} end`,
			lastHereAt: sql`now()`
		})
		.where(eq(user.id, userId));
}

/** Name, value and attributes of a cookie, as SvelteKit's `cookies.set` takes them. */
export type SessionCookie = {
	name: string;
	value: string;
	attributes: ReturnType<Lucia['createSessionCookie']>['attributes'] & { path: string };
};

const asCookie = ({ name, value, attributes }: ReturnType<Lucia['createSessionCookie']>) => ({
	name,
	value,
	attributes: { ...attributes, path: '/' }
});

export async function startSession(
	userId: string
): Promise<{ sessionId: string; cookie: SessionCookie }> {
	const { id } = await lucia().createSession(userId, {});
	await recordUse(userId);
	return { sessionId: id, cookie: asCookie(lucia().createSessionCookie(id)) };
}

/** Ends one session; the answer is the cookie that takes the place of its cookie. */
export async function endSession(sessionId: string): Promise<SessionCookie> {
	await lucia().invalidateSession(sessionId);
	return asCookie(lucia().createBlankSessionCookie());
}

/** Ends a person's sessions, all or all but one, in the caller's transaction. */
export async function endSessions(tx: Db, userId: string, except?: string): Promise<void> {
	await tx
		.delete(session)
		.where(and(eq(session.userId, userId), except ? ne(session.id, except) : undefined));
	// Whoever had the account may have made themselves a way in.
	await tx.delete(apiToken).where(eq(apiToken.userId, userId));
}

export async function countSessions(userId: string): Promise<number> {
	return (await lucia().getUserSessions(userId)).length;
}
