/** Who is in a programme, and as what. */
import { and, asc, eq, sql } from 'drizzle-orm';
import { db } from '../db';
import { membership, programme, user } from '../db/schema';
import type { Role } from '../auth/permissions';

/** The person's role in the programme; null when they are not in it. */
export async function roleIn(userId: string, programmeId: string): Promise<Role | null> {
	const [row] = await db
		.select({ role: membership.role })
		.from(membership)
		.where(and(eq(membership.userId, userId), eq(membership.programmeId, programmeId)));
	return row?.role ?? null;
}

/** Everybody in the programme, leads first, then by name. */
export function membersOf(programmeId: string) {
	return db
		.select({
			userId: user.id,
			name: user.name,
			email: user.email,
			role: membership.role,
			field: membership.field,
			lastHereAt: membership.lastHereAt
		})
		.from(membership)
		.innerJoin(user, eq(user.id, membership.userId))
		.where(eq(membership.programmeId, programmeId))
		.orderBy(asc(membership.role), asc(user.name));
}

/** The programmes that a person is in, with their role. */
export function programmesOf(userId: string) {
	return db
		.select({ programme, role: membership.role, lastHereAt: membership.lastHereAt })
		.from(membership)
		.innerJoin(programme, eq(programme.id, membership.programmeId))
		.where(eq(membership.userId, userId))
		.orderBy(asc(programme.code));
}

/** Notes that somebody is in the programme now, to a minute. */
export async function recordHere(userId: string, programmeId: string): Promise<void> {
	await db
		.update(membership)
		.set({ lastHereAt: sql`now()` })
		.where(
			and(
				eq(membership.userId, userId),
				eq(membership.programmeId, programmeId),
				sql`coalesce(${membership.lastHereAt} < now() - interval '1 minute', true)`
			)
		);
}
