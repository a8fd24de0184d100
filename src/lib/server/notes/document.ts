/**
 * A note's document in the database: a snapshot and the updates after it. Updates of a note are
 * numbered 1, 2, 3 … in the order of their commits: the number is taken under the lock of the note's
 * row, so whoever sees number n sees all before it.
 */
import { and, eq, lte, sql } from 'drizzle-orm';
import * as Y from 'yjs';
import { db as database, type Db } from '../db';
import { note, noteSnapshot, noteUpdate } from '../db/schema';
import { notify } from '../events';

export type StoredUpdate = {
	seq: number;
	update: Uint8Array;
	/** Who wrote it; null for a snapshot, which many did. */
	userId: string | null;
};

export type NewUpdate = { update: Uint8Array; userId: string };

/** What a holder of the document at `seq` lacks. A snapshot stands for all updates folded into it. */
export async function updatesSince(
	noteId: string,
	seq: number,
	db: Db = database
): Promise<StoredUpdate[]> {
	// One statement, so that a folding between two queries cannot hide updates.
	const { rows } = await db.execute<{ seq: string; update: Buffer; user_id: string | null }>(sql`
		with folded as (
			select seq, state from note_snapshot where note_id = ${noteId} and seq > ${seq}
		)
		select seq, state as update, null as user_id from folded
		union all
		select seq, update, user_id from note_update
		where note_id = ${noteId} and seq > greatest(${seq}, (select seq from folded))
		order by seq, user_id nulls first`);
	return rows.map((row) => ({
		seq: Number(row.seq),
		update: new Uint8Array(row.update),
		userId: row.user_id
	}));
}

/** The document at its newest committed update. */
export async function loadDocument(
	noteId: string,
	db: Db = database
): Promise<{ doc: Y.Doc; seq: number }> {
	const doc = new Y.Doc();
	const updates = await updatesSince(noteId, 0, db);
	doc.transact(() => {
		for (const { update } of updates) Y.applyUpdate(doc, update);
	});
	return { doc, seq: updates.at(-1)?.seq ?? 0 };
}

/**
 * Commits updates under the next numbers and tells other processes; null when the note is gone.
 * `from` names this process, which need not fetch them.
 */
export async function appendUpdates(
	noteId: string,
	updates: NewUpdate[],
	from: string,
	db: Db = database
): Promise<{ first: number; last: number; at: Date } | null> {
	const changedBy = updates.at(-1)!.userId;
	return db.transaction(async (tx) => {
		const [numbered] = await tx
			.update(note)
			.set({ seq: sql`${note.seq} + ${updates.length}`, changedAt: sql`now()`, changedBy })
			.where(eq(note.id, noteId))
			.returning({ last: note.seq, at: note.changedAt });
		if (!numbered) return null;
		const { last, at } = numbered;
		const first = last - updates.length + 1;
		await tx
			.insert(noteUpdate)
			.values(updates.map((update, index) => ({ noteId, seq: first + index, ...update })));
		await notify(tx, { kind: 'updates', noteId, seq: last, from });
		return { first, last, at };
	});
}

/**
 * Folds all committed updates into the snapshot and removes them: a document's log does not grow
 * without end, and opening a note reads one row. Who wrote an item is kept in `note_item`.
 */
export async function foldUpdates(noteId: string): Promise<void> {
	await database.transaction(async (tx) => {
		const { doc, seq } = await loadDocument(noteId, tx);
		const state = Y.encodeStateAsUpdate(doc);
		doc.destroy();
		if (seq === 0) return;
		await tx
			.insert(noteSnapshot)
			.values({ noteId, seq, state })
			.onConflictDoUpdate({
				target: noteSnapshot.noteId,
				set: { seq, state, createdAt: sql`now()` },
				setWhere: lte(noteSnapshot.seq, seq)
			});
		await tx.delete(noteUpdate).where(and(eq(noteUpdate.noteId, noteId), lte(noteUpdate.seq, seq)));
	});
}
