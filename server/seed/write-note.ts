/**
 * Writes one note as people would have: its first form, the baseline at the first gate, then the edits
 * and remarks since, each by its writer, with the same services that serve people.
 */
import { createReadStream } from 'node:fs';
import { eq } from 'drizzle-orm';
import * as Y from 'yjs';
import { addItem, itemsMap, proseField, textField } from '$lib/note/document';
import type { Note, Programme } from '$lib/server/auth/guard';
import { freeze } from '$lib/server/baselines/freeze';
import { db } from '$lib/server/db';
import { note as noteTable, remark as remarkTable, type gate } from '$lib/server/db/schema';
import { storeEvidence } from '$lib/server/evidence/evidence';
import { createNote } from '$lib/server/notes/create';
import { editNote, fillNote } from '$lib/server/notes/edit';
import { pinRemark } from '$lib/server/remarks/pin';
import { answerRemark, settleRemark } from '$lib/server/remarks/thread';
import type { People } from './index';
import type { DemoNote, DemoRemark } from './notes';

type Job = {
	demo: DemoNote;
	programme: Programme;
	gates: (typeof gate.$inferSelect)[];
	people: People;
};

export async function writeNote(job: Job): Promise<void> {
	const { demo, people, programme, gates } = job;
	const { id } = await createNote(programme, people.get(demo.creator)!.id, {
		title: demo.title,
		department: demo.department,
		technicalReference: demo.technicalReference,
		approverId: people.get(demo.approver)!.id,
		gateId: gates[0]!.id
	});
	const write = (by: string, edit: (doc: Y.Doc) => void) => editNote(id, people.get(by)!.id, edit);
	await fillNote(id, people.get(demo.creator)!.id, {
		format: 'holdfast-note',
		version: 1,
		thinLimit: demo.thinLimit,
		items: demo.items
	});
	await writeRemarks(job, id, 'before the baseline');
	if (demo.frozen) await freezeFirst(job, id, demo.frozen.waivers);

	for (const { by, after, item } of demo.additions)
		await write(by, (doc) => void addItem(doc, item, { after }));
	for (const { by, item, field, value } of demo.edits)
		await write(by, (doc) => retype(doc, item, field, value));
	for (const { by, item, words } of demo.sentences ?? [])
		await write(by, (doc) => addSentence(doc, item, words));
	for (const { by, item, name } of demo.files) {
		const file = await storeEvidence({
			noteId: id,
			userId: people.get(by)!.id,
			name,
			body: createReadStream(`server/seed/files/${name}`)
		});
		await write(by, (doc) => attach(doc, item, file));
	}
	await writeRemarks(job, id, 'since');
}

async function current(noteId: string): Promise<Note> {
	const [row] = await db.select().from(noteTable).where(eq(noteTable.id, noteId));
	return row!;
}

function retype(doc: Y.Doc, item: string, field: string, value: string): void {
	const text = textField(doc, item, field)!;
	text.delete(0, text.length);
	text.insert(0, value);
}

function addSentence(doc: Y.Doc, item: string, words: string): void {
	const prose = proseField(doc, item)!;
	const lastParagraph = prose.get(prose.length - 1) as Y.XmlElement;
	lastParagraph.push([new Y.XmlText(words)]);
}

function attach(doc: Y.Doc, item: string, file: { fileId: string }): void {
	const files = itemsMap(doc).get(item)!.get('files') as Y.Map<unknown>;
	files.set(file.fileId, { ...file, position: files.size });
}

async function freezeFirst(
	{ programme, gates, people }: Job,
	noteId: string,
	waivers: { itemId: string; reason: string }[]
): Promise<void> {
	const note = await current(noteId);
	const input = { gateId: gates[0]!.id, revision: note.revision, seenSeq: note.seq, waivers };
	await freeze({ note, programme, person: people.get('solvang')!, input });
}

async function writeRemarks(
	{ demo, programme, people }: Job,
	noteId: string,
	when: DemoRemark['pinned']
): Promise<void> {
	const note = await current(noteId);
	for (const { by, item, body, replies, settledBy } of demo.remarks.filter(
		({ pinned }) => pinned === when
	)) {
		const person = people.get(by)!;
		const id = await pinRemark({ note, programme, person, itemId: item, body });
		const [row] = await db.select().from(remarkTable).where(eq(remarkTable.id, id));
		const thread = { remark: row!, note, programme };
		for (const reply of replies) await answerRemark(thread, people.get(reply.by)!, reply.body);
		if (settledBy) await settleRemark(thread, people.get(settledBy)!, true);
	}
}
