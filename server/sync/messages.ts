/** The messages of y-websocket that the server sends. */
import * as decoding from 'lib0/decoding';
import * as encoding from 'lib0/encoding';
import * as Y from 'yjs';
import { MESSAGE } from '$lib/sync/protocol';

/** Kinds of sync message, as in y-protocols: what do you lack, here is what you lack, here is an edit. */
export const SYNC = { QUESTION: 0, ANSWER: 1, UPDATE: 2 } as const;

function syncMessage(kind: number, content: Uint8Array): Uint8Array {
	const encoder = encoding.createEncoder();
	encoding.writeVarUint(encoder, MESSAGE.SYNC);
	encoding.writeVarUint(encoder, kind);
	encoding.writeVarUint8Array(encoder, content);
	return encoding.toUint8Array(encoder);
}

export const questionMessage = (doc: Y.Doc) => syncMessage(SYNC.QUESTION, Y.encodeStateVector(doc));

export const answerMessage = (doc: Y.Doc, stateVector: Uint8Array) =>
	syncMessage(SYNC.ANSWER, Y.encodeStateAsUpdate(doc, stateVector));

export const updateMessage = (update: Uint8Array) => syncMessage(SYNC.UPDATE, update);

export function awarenessMessage(update: Uint8Array): Uint8Array {
	const encoder = encoding.createEncoder();
	encoding.writeVarUint(encoder, MESSAGE.AWARENESS);
	encoding.writeVarUint8Array(encoder, update);
	return encoding.toUint8Array(encoder);
}

/**
 * Reads an update whole before any of it is applied: Yjs applies as it reads, and one that breaks off
 * would be half in the document.
 * @throws when it cannot be read, or something follows it.
 */
export function checkUpdate(update: Uint8Array): void {
	Y.decodeUpdate(update);
}

/** Reads a state vector; @throws when it is none. */
export function checkStateVector(vector: Uint8Array): void {
	const decoder = decoding.createDecoder(vector);
	const clients = decoding.readVarUint(decoder);
	for (let client = 0; client < clients; client++) {
		decoding.readVarUint(decoder);
		decoding.readVarUint(decoder);
	}
}
