/**
 * Writes one note as people would have: its first form, the baseline at the first gate, then the edits
 * and remarks since, each by its writer, with the same services that serve people.
 */
import { createReadStream } from 'node:fs';
import { eq } from 'drizzle-orm';
import * as Y from 'yjs';
import { addItem, itemsMap, textField } from '$lib/note/document';
import { documentFrom } from '$lib/note/interchange';
import type { Note, Programme } from '$lib/server/auth/guard';
import { freeze } from '$lib/server/baselines/freeze';
import { db } from '$lib/server/db';
import { note as noteTable, remark as remarkTable, type gate } from '$lib/server/db/schema';
import { evaluateContent } from '$lib/server/engine/evaluate';
import { storeEvidence } from '$lib/server/evidence/evidence';
import { appendUpdates } from '$lib/server/notes/document';
import { pinRemark } from '$lib/server/remarks/pin';
import { answerRemark, settleRemark } from '$lib/server/remarks/thread';
import { Watcher } from '../sync/watcher';
import type { People } from './index';
import type { DemoNote, DemoRemark } from './notes';

type Job = {
	demo: DemoNote;
	number: string;
	programme: Programme;
	gates: (typeof gate.$inferSelect)[];
	people: People;
};

export async function writeNote(job: Job): Promise<void> {
	const { demo, people } = job;
	const note = await insertNote(job);
	const desk = new Desk(note, people);
	await desk.write(demo.creator, (doc) => {
		const first = documentFrom({
			format: 'holdfast-note',
			version: 1,
			thinLimit: demo.thinLimit,
			items: demo.items
		});
		Y.applyUpdate(doc, Y.encodeStateAsUpdate(first), { userId: people.get(demo.creator)!.id });
	});
	await writeRemarks(job, desk, 'before the baseline');
	if (demo.frozen) await freezeFirst(job, desk, demo.frozen.waivers);

	for (const { by, after, item } of demo.additions)
		await desk.write(by, (doc, origin) => addItem(doc, item, { after, origin }));
	for (const { by, item, field, value } of demo.edits)
		await desk.write(by, (doc, origin) => retype(doc, item, field, value, origin));
	for (const { by, item, name } of demo.files) await attach(desk, people, by, item, name);
	await writeRemarks(job, desk, 'since');
	desk.close();
}

async function insertNote({ demo, number, programme, gates, people }: Job): Promise<Note> {
	const [row] = await db
		.insert(noteTable)
		.values({
			programmeId: programme.id,
			number,
			title: demo.title,
			department: demo.department,
			technicalReference: demo.technicalReference,
			creatorId: people.get(demo.creator)!.id,
			approverId: people.get(demo.approver)!.id,
			gateId: gates[0]!.id
		})
		.returning();
	return row!;
}

/** The note open before somebody: what they write is committed and observed under their name. */
class Desk {
	readonly doc = new Y.Doc();
	seq = 0;
	#updates: Uint8Array[] = [];
	#watcher: Watcher;

	constructor(
		readonly note: Note,
		private readonly people: People
	) {
		this.#watcher = new Watcher(note.id, this.doc, () => this.seq, evaluateContent);
		this.#watcher.begin();
		this.doc.on('update', (update: Uint8Array) => this.#updates.push(update));
	}

	async write(by: string, edit: (doc: Y.Doc, origin: { userId: string }) => void): Promise<void> {
		const { id: userId } = this.people.get(by)!;
		edit(this.doc, { userId });
		const updates = this.#updates.map((update) => ({ update, userId }));
		this.#updates = [];
		const committed = await appendUpdates(this.note.id, updates, 'seed');
		this.seq = committed!.last;
		this.#watcher.wake();
		await this.#watcher.finish();
	}

	async current(): Promise<Note> {
		const [row] = await db.select().from(noteTable).where(eq(noteTable.id, this.note.id));
		return row!;
	}

	close(): void {
		this.#watcher.destroy();
		this.doc.destroy();
	}
}

function retype(doc: Y.Doc, item: string, field: string, value: string, origin: unknown): void {
	const text = textField(doc, item, field)!;
	doc.transact(() => {
		text.delete(0, text.length);
		text.insert(0, value);
	}, origin);
}

async function freezeFirst(
	{ programme, gates, people }: Job,
	desk: Desk,
	waivers: { itemId: string; reason: string }[]
): Promise<void> {
	const note = await desk.current();
	const input = { gateId: gates[0]!.id, revision: note.revision, seenSeq: desk.seq, waivers };
	await freeze({ note, programme, person: people.get('solvang')!, input });
}

async function attach(desk: Desk, people: People, by: string, itemId: string, name: string) {
	const file = await storeEvidence({
		noteId: desk.note.id,
		userId: people.get(by)!.id,
		name,
		body: createReadStream(`server/seed/files/${name}`)
	});
	await desk.write(by, (doc, origin) => {
		const files = itemsMap(doc).get(itemId)!.get('files') as Y.Map<unknown>;
		doc.transact(() => files.set(file.fileId, { ...file, position: files.size }), origin);
	});
}

async function writeRemarks(
	{ demo, programme, people }: Job,
	desk: Desk,
	when: DemoRemark['pinned']
): Promise<void> {
	for (const remark of demo.remarks.filter(({ pinned }) => pinned === when)) {
		const { note } = desk;
		const id = await pinRemark({
			note,
			programme,
			person: people.get(remark.by)!,
			itemId: remark.item,
			body: remark.body
		});
		const [row] = await db.select().from(remarkTable).where(eq(remarkTable.id, id));
		const thread = { remark: row!, note, programme };
		for (const { by, body } of remark.replies) await answerRemark(thread, people.get(by)!, body);
		if (remark.settledBy) await settleRemark(thread, people.get(remark.settledBy)!, true);
	}
}
