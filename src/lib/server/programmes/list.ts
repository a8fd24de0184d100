import { asc, countDistinct, eq, sql } from 'drizzle-orm';
import { db } from '../db';
import { invitation, membership, note, programme, user } from '../db/schema';

/** Every programme of the site, for the administrator: who leads it and how large it is, no more. */
export function listProgrammes() {
	return db
		.select({
			code: programme.code,
			title: programme.title,
			legalOwner: programme.legalOwner,
			createdAt: programme.createdAt,
			leads: sql<
				string[]
			>`coalesce(array_agg(distinct ${user.name}) filter (where ${membership.role} = 'lead'), '{}')`,
			invited: sql<string[]>`coalesce(array_agg(distinct ${invitation.email}) filter
				(where ${invitation.role} = 'lead' and ${invitation.acceptedAt} is null
				and ${invitation.declinedAt} is null and ${invitation.withdrawnAt} is null), '{}')`,
			people: countDistinct(membership.userId),
			notes: countDistinct(note.id)
		})
		.from(programme)
		.leftJoin(membership, eq(membership.programmeId, programme.id))
		.leftJoin(user, eq(user.id, membership.userId))
		.leftJoin(note, eq(note.programmeId, programme.id))
		.leftJoin(invitation, eq(invitation.programmeId, programme.id))
		.groupBy(programme.id)
		.orderBy(asc(programme.code));
}
