/**
 * Telling every process that something changed, as part of the change: the notice goes out when the
 * transaction commits, and not at all when it does not.
 */
import { sql } from 'drizzle-orm';
import { z } from 'zod';
import { EVENT_KINDS } from '$lib/sync/protocol';
import type { Db } from './db';

/** The PostgreSQL channel of all notices. */
export const CHANNEL = 'holdfast';

/**
 * An event goes to everybody on the note, or on any note of the programme. "access" says that a
 * person's session or role changed, in one programme or in all; nobody but the server hears it.
 */
export const announcementSchema = z.object({
	kind: z.enum([...EVENT_KINDS, 'access']),
	noteId: z.guid().optional(),
	programmeId: z.guid().optional(),
	userId: z.guid().optional()
});
export type Announcement = z.infer<typeof announcementSchema>;

/** Committed updates of a note's document, up to `seq`, by the process `from`. */
const updatesSchema = z.object({
	kind: z.literal('updates'),
	noteId: z.guid(),
	seq: z.number(),
	from: z.string()
});

/** Who is on a note through the process `from`: an awareness update in base64. */
const presenceSchema = z.object({
	kind: z.literal('presence'),
	noteId: z.guid(),
	from: z.string(),
	update: z.base64()
});

/** The process `from` opened a note and asks the others who is on it. */
const whoIsThereSchema = z.object({
	kind: z.literal('who is there'),
	noteId: z.guid(),
	from: z.string()
});

export const noticeSchema = z.union([
	updatesSchema,
	presenceSchema,
	whoIsThereSchema,
	announcementSchema
]);
export type Notice = z.infer<typeof noticeSchema>;

export function announce(tx: Db, event: Announcement): Promise<void> {
	return notify(tx, event);
}

export async function notify(tx: Db, notice: Notice): Promise<void> {
	await tx.execute(sql`select pg_notify(${CHANNEL}, ${JSON.stringify(notice)})`);
}
