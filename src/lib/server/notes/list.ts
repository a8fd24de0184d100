/** The register of notes: one row a note, in the order of their numbers. */
import { asc, desc, eq, inArray, isNull, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { db } from '../db';
import { baseline, gate, note, noteSummary, programme, remark, user } from '../db/schema';
import { noteStatus } from './status';

const changer = alias(user, 'changer');

export async function listNotes(programmeIds: string[]) {
	if (programmeIds.length === 0) return [];
	const latest = db
		.selectDistinctOn([baseline.noteId], {
			noteId: baseline.noteId,
			id: baseline.id,
			revision: baseline.revision,
			seq: baseline.seq
		})
		.from(baseline)
		.orderBy(baseline.noteId, desc(baseline.frozenAt))
		.as('latest');
	const openRemarks = db
		.select({ noteId: remark.noteId, count: sql<number>`count(*)::int`.as('count') })
		.from(remark)
		.where(isNull(remark.settledAt))
		.groupBy(remark.noteId)
		.as('open_remarks');
	const rows = await db
		.select({
			id: note.id,
			programmeId: note.programmeId,
			programmeCode: programme.code,
			number: note.number,
			title: note.title,
			revision: note.revision,
			seq: note.seq,
			gate: { id: gate.id, kind: gate.kind, name: gate.name },
			baseline: { id: latest.id, revision: latest.revision, seq: latest.seq },
			checks: noteSummary.checks,
			marks: noteSummary.marks,
			itemCount: noteSummary.itemCount,
			openRemarks: sql<number>`coalesce(${openRemarks.count}, 0)`,
			changedAt: note.changedAt,
			changedBy: changer.name
		})
		.from(note)
		.innerJoin(programme, eq(programme.id, note.programmeId))
		.leftJoin(gate, eq(gate.id, note.gateId))
		.leftJoin(noteSummary, eq(noteSummary.noteId, note.id))
		.leftJoin(latest, eq(latest.noteId, note.id))
		.leftJoin(openRemarks, eq(openRemarks.noteId, note.id))
		.leftJoin(changer, eq(changer.id, note.changedBy))
		.where(inArray(note.programmeId, programmeIds))
		.orderBy(asc(programme.code), asc(note.number));
	return rows.map(({ seq, baseline, changedAt, ...row }) => ({
		...row,
		status: noteStatus(seq, baseline),
		baseline: baseline && { id: baseline.id, revision: baseline.revision },
		checks: row.checks ?? { holds: 0, thin: 0, fails: 0, waits: 0 },
		marks: row.marks ?? [],
		itemCount: row.itemCount ?? 0,
		changedAt: changedAt.toISOString()
	}));
}

export type ListedNote = Awaited<ReturnType<typeof listNotes>>[number];
