/**
 * What goes over the socket of a note, `/sync/{note id}`. Each message is binary and begins with its
 * type as a variable-length unsigned integer (lib0's encoding, as in y-protocols).
 *
 * 0 sync, 1 awareness and 3 query awareness are y-websocket's own, so that its stock provider works.
 * These are ours beside them:
 *
 * - MARK, client to server: varUint count. "All my edits up to this count have gone before this."
 * - SAVED, server to client: varUint count, varUint milliseconds since 1970. Everything up to that mark
 *   is committed to the database. Sent once for each mark, never before the commit.
 * - REFUSED, server to client: varString reason. Edits of this connection are not taken; the reason is
 *   a sentence for the person. Sent for an edit, and for a mark, of somebody who may not edit.
 * - EVENT, server to client: varString JSON of a `NoteEvent`. Something beside the document changed and
 *   can be fetched again.
 */
import * as decoding from 'lib0/decoding';
import * as encoding from 'lib0/encoding';

export const MESSAGE = {
	SYNC: 0,
	AWARENESS: 1,
	QUERY_AWARENESS: 3,
	MARK: 100,
	SAVED: 101,
	REFUSED: 102,
	EVENT: 103
} as const;

export const EVENT_KINDS = ['remarks', 'baselines', 'note', 'movements', 'people'] as const;
export type NoteEvent = { kind: (typeof EVENT_KINDS)[number] };

function message(type: number, write: (encoder: encoding.Encoder) => void): Uint8Array {
	const encoder = encoding.createEncoder();
	encoding.writeVarUint(encoder, type);
	write(encoder);
	return encoding.toUint8Array(encoder);
}

export const markMessage = (count: number) =>
	message(MESSAGE.MARK, (encoder) => encoding.writeVarUint(encoder, count));

export const savedMessage = (count: number, at: Date) =>
	message(MESSAGE.SAVED, (encoder) => {
		encoding.writeVarUint(encoder, count);
		encoding.writeVarUint(encoder, at.getTime());
	});

export const refusedMessage = (reason: string) =>
	message(MESSAGE.REFUSED, (encoder) => encoding.writeVarString(encoder, reason));

export const eventMessage = (event: NoteEvent) =>
	message(MESSAGE.EVENT, (encoder) => encoding.writeVarString(encoder, JSON.stringify(event)));

export const readMark = (decoder: decoding.Decoder): number => decoding.readVarUint(decoder);

export function readSaved(decoder: decoding.Decoder): { count: number; at: Date } {
	const count = decoding.readVarUint(decoder);
	return { count, at: new Date(decoding.readVarUint(decoder)) };
}

export const readRefused = (decoder: decoding.Decoder): string => decoding.readVarString(decoder);

export const readEvent = (decoder: decoding.Decoder): NoteEvent =>
	JSON.parse(decoding.readVarString(decoder)) as NoteEvent;
