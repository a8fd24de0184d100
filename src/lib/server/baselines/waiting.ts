/** Who has looked at which baseline. */
import { and, desc, eq, isNull, ne } from 'drizzle-orm';
import { db } from '../db';
import { baseline, baselineView, membership, note, programme, user } from '../db/schema';

export async function markViewed(baselineId: string, userId: string): Promise<void> {
	await db.insert(baselineView).values({ baselineId, userId }).onConflictDoNothing();
}

/** Baselines of the person's programmes, newest first, that they neither froze nor looked at yet. */
export function baselinesWaitingFor(userId: string) {
	return db
		.select({
			baselineId: baseline.id,
			programmeCode: programme.code,
			noteNumber: note.number,
			noteTitle: note.title,
			revision: baseline.revision,
			frozenBy: user.name,
			frozenAt: baseline.frozenAt
		})
		.from(baseline)
		.innerJoin(note, eq(note.id, baseline.noteId))
		.innerJoin(programme, eq(programme.id, note.programmeId))
		.innerJoin(user, eq(user.id, baseline.frozenBy))
		.innerJoin(
			membership,
			and(eq(membership.programmeId, programme.id), eq(membership.userId, userId))
		)
		.leftJoin(
			baselineView,
			and(eq(baselineView.baselineId, baseline.id), eq(baselineView.userId, userId))
		)
		.where(and(isNull(baselineView.baselineId), ne(baseline.frozenBy, userId)))
		.orderBy(desc(baseline.frozenAt));
}
