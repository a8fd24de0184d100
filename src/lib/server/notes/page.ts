/** What the page of a note is loaded with; the rest comes over the socket. Moments are ISO texts. */
import { desc, eq } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import * as Y from 'yjs';
import type { Note } from '../auth/guard';
import { db } from '../db';
import { baseline, gate, note, user } from '../db/schema';
import { loadDocument } from './document';
import { noteStatus } from './status';

const creator = alias(user, 'creator');
const approver = alias(user, 'approver');
const changer = alias(user, 'changer');

export async function noteForPage({ id }: Pick<Note, 'id'>) {
	const [[row], { doc, seq }, [latest]] = await Promise.all([
		db
			.select({
				id: note.id,
				number: note.number,
				title: note.title,
				department: note.department,
				technicalReference: note.technicalReference,
				revision: note.revision,
				gate: { id: gate.id, kind: gate.kind, name: gate.name, date: gate.date },
				creator: { id: creator.id, name: creator.name },
				approver: { id: approver.id, name: approver.name },
				changedAt: note.changedAt,
				changedBy: changer.name,
				createdAt: note.createdAt
			})
			.from(note)
			.innerJoin(creator, eq(creator.id, note.creatorId))
			.leftJoin(approver, eq(approver.id, note.approverId))
			.leftJoin(changer, eq(changer.id, note.changedBy))
			.leftJoin(gate, eq(gate.id, note.gateId))
			.where(eq(note.id, id)),
		loadDocument(id),
		db
			.select({
				id: baseline.id,
				revision: baseline.revision,
				seq: baseline.seq,
				digest: baseline.digest,
				frozenAt: baseline.frozenAt
			})
			.from(baseline)
			.where(eq(baseline.noteId, id))
			.orderBy(desc(baseline.frozenAt))
			.limit(1)
	]);
	const state = Buffer.from(Y.encodeStateAsUpdate(doc)).toString('base64');
	doc.destroy();
	return {
		...row!,
		changedAt: row!.changedAt.toISOString(),
		createdAt: row!.createdAt.toISOString(),
		status: noteStatus(seq, latest ?? null),
		baseline: latest ? { ...latest, frozenAt: latest.frozenAt.toISOString() } : null,
		/** The document at update `seq`, base64; what `NoteSession` begins with. */
		state,
		seq
	};
}

export type NotePage = Awaited<ReturnType<typeof noteForPage>>;
