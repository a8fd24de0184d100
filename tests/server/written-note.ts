/** A note with items, written as the sync server would, and calls of API routes as somebody. */
import * as Y from 'yjs';
import type { NewItem } from '$lib/note/document';
import { addItems } from '$lib/note/document';
import { DEFAULT_THIN_LIMIT } from '$lib/note/document';
import { documentFrom } from '$lib/note/interchange';
import type { SignedIn } from '$lib/server/auth/sessions';
import { appendUpdates, loadDocument } from '$lib/server/notes/document';
import type { note } from '$lib/server/db/schema';
import { makeNote } from './fixtures';

export async function writtenNote(
	programmeId: string,
	creator: SignedIn,
	items: NewItem[],
	values: Partial<typeof note.$inferInsert> = {}
) {
	const made = await makeNote(programmeId, creator, values);
	const doc = documentFrom({
		format: 'holdfast-note',
		version: 1,
		thinLimit: DEFAULT_THIN_LIMIT,
		items: []
	});
	addItems(doc, items, { after: null });
	const update = Y.encodeStateAsUpdate(doc);
	await appendUpdates(made.id, [{ update, userId: creator.id }], 'test');
	return { ...made, seq: 1 };
}

/** One more edit, committed. */
export async function edit(noteId: string, person: SignedIn, work: (doc: Y.Doc) => void) {
	const { doc } = await loadDocument(noteId);
	const before = Y.encodeStateVector(doc);
	work(doc);
	const update = Y.encodeStateAsUpdate(doc, before);
	await appendUpdates(noteId, [{ update, userId: person.id }], 'test');
}

type Handler = (event: never) => Response | Promise<Response>;

/** What the route answers somebody; refusals are thrown as `Problem`. */
export async function call(
	handler: Handler,
	person: SignedIn | null,
	params: Record<string, string>,
	{ body, query = '' }: { body?: unknown; query?: string } = {}
): Promise<Response> {
	const url = new URL(`http://127.0.0.1/api/${query}`);
	const request = new Request(url, {
		method: body === undefined ? 'GET' : 'POST',
		...(body !== undefined && { body: JSON.stringify(body) })
	});
	return handler({ url, request, params, locals: { person } } as never);
}
