/** Carets in shared texts, as relative positions in the awareness of the session. */
import * as Y from 'yjs';
import type { NoteSession } from '$lib/sync/note-session.svelte';

export type Caret = { at: number; name: string };

type Awareness = NoteSession['awareness'];

export function publishCaret(awareness: Awareness, text: Y.Text, at: number | null): void {
	const position =
		at === null ? null : Y.relativePositionToJSON(Y.createRelativePositionFromTypeIndex(text, at));
	awareness.setLocalStateField('cursor', position && { anchor: position, head: position });
}

/** Where others' carets are in a text. */
export function caretsIn(awareness: Awareness, text: Y.Text): Caret[] {
	const doc = text.doc;
	if (!doc) return [];
	return [...awareness.getStates()].flatMap(([clientId, state]) => {
		const head: unknown = state.cursor?.head;
		if (clientId === doc.clientID || !head) return [];
		const place = Y.createAbsolutePositionFromRelativePosition(
			Y.createRelativePositionFromJSON(head),
			doc
		);
		return place?.type === text ? [{ at: place.index, name: String(state.user?.name ?? '') }] : [];
	});
}
