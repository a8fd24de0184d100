/**
 * Pinning a remark to an item. What it is pinned to is not taken from the client: the server computes
 * the note at its newest committed update and keeps the item as it stands there, with the number of
 * that update. So no remark can claim a figure that the note never had.
 */
import { numberItems } from '$lib/note/numbering';
import { pinnedValue } from '$lib/note/pinned';
import { projectNote } from '$lib/note/projection';
import type { Note, Programme } from '../auth/guard';
import type { SignedIn } from '../auth/sessions';
import { db } from '../db';
import { remark } from '../db/schema';
import { evaluateContent } from '../engine/evaluate';
import { announce } from '../events';
import { loadDocument } from '../notes/document';
import { Problem } from '../problems';
import { tellThread } from './notify';

type Pin = {
	note: Note;
	programme: Programme;
	person: SignedIn;
	itemId: string;
	body: string;
};

/** Returns the id of the new remark. */
export async function pinRemark({ note, programme, person, itemId, body }: Pin): Promise<string> {
	const { doc, seq } = await loadDocument(note.id, db);
	const content = projectNote(doc);
	const item = content.items.find(({ id }) => id === itemId);
	if (!item) {
		throw new Problem(
			409,
			`${note.number} has no such item. It was removed, or the edit that adds it is not saved yet.`
		);
	}
	const results = await evaluateContent(content);
	const pinned = pinnedValue(
		item,
		results.find(({ id }) => id === itemId),
		numberItems(content.items).get(itemId) ?? ''
	);
	return db.transaction(async (tx) => {
		const [row] = await tx
			.insert(remark)
			.values({ noteId: note.id, itemId, seq, pinned, authorId: person.id, body })
			.returning();
		await tellThread(tx, { remark: row!, note, programme, writer: person, words: body });
		await announce(tx, { kind: 'remarks', noteId: note.id });
		return row!.id;
	});
}
