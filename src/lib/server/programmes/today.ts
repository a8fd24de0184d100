/** What the home page shows: what waits for a person, what moved, and where their programmes are. */
import { and, desc, eq, gt, isNull, ne, or } from 'drizzle-orm';
import { toJson } from '$lib/json';
import { baselinesWaitingFor } from '../baselines/waiting';
import { db } from '../db';
import { checkMovement, membership, note, noteItem, programme, user } from '../db/schema';
import { gatesOf } from '../gates/gates';
import { listNotes } from '../notes/list';
import { remarksWaitingFor } from '../remarks/waiting';
import { programmesOf } from './members';

export async function today(userId: string) {
	const [remarks, baselines, since, programmes] = await Promise.all([
		remarksWaitingFor(userId),
		baselinesWaitingFor(userId),
		lastVisit(userId),
		programmeSummaries(userId)
	]);
	return toJson({
		remarks,
		baselines,
		moved: { since, checks: await movedSince(userId, since) },
		programmes,
		now: new Date()
	});
}

export type Today = Awaited<ReturnType<typeof today>>;

async function lastVisit(userId: string): Promise<Date | null> {
	const [row] = await db
		.select({ at: user.lastVisitEndedAt })
		.from(user)
		.where(eq(user.id, userId));
	return row?.at ?? null;
}

/** Checks that somebody else moved from one state to another since then; nothing on a first visit. */
function movedSince(userId: string, since: Date | null) {
	if (since === null) return [];
	const bySomebodyElse = or(isNull(checkMovement.movedBy), ne(checkMovement.movedBy, userId));
	return db
		.select({
			itemId: checkMovement.itemId,
			programmeCode: programme.code,
			noteNumber: note.number,
			number: noteItem.number,
			description: noteItem.description,
			stateBefore: checkMovement.stateBefore,
			state: checkMovement.state,
			movedBy: user.name,
			movedAt: checkMovement.movedAt
		})
		.from(checkMovement)
		.innerJoin(note, eq(note.id, checkMovement.noteId))
		.innerJoin(programme, eq(programme.id, note.programmeId))
		.innerJoin(
			membership,
			and(eq(membership.programmeId, programme.id), eq(membership.userId, userId))
		)
		.innerJoin(
			noteItem,
			and(
				eq(noteItem.noteId, checkMovement.noteId),
				eq(noteItem.itemId, checkMovement.itemId),
				isNull(noteItem.removedAt)
			)
		)
		.leftJoin(user, eq(user.id, checkMovement.movedBy))
		.where(and(gt(checkMovement.movedAt, since), bySomebodyElse))
		.orderBy(desc(checkMovement.movedAt))
		.limit(20);
}

/** The programmes that a person is in, each with its gates and notes. */
export async function programmeSummaries(userId: string) {
	const places = await programmesOf(userId);
	const notes = await listNotes(places.map((place) => place.programme.id));
	return Promise.all(
		places.map(async ({ programme: { id, code, title, summary }, role }) => ({
			code,
			title,
			summary,
			role,
			gates: await gatesOf(id),
			notes: notes
				.filter((one) => one.programmeId === id)
				.map(({ number, title, checks, marks, openRemarks }) => ({
					number,
					title,
					checks,
					marks,
					openRemarks
				}))
		}))
	);
}
