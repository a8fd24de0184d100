/** Who wrote an item, and its number, symbol and description when last seen. Outlives the item. */
import { eq, sql } from 'drizzle-orm';
import type { Item, NoteContent } from '$lib/note/items';
import { numberItems } from '$lib/note/numbering';
import { readableProse } from '$lib/note/readable';
import type { Db } from '../db';
import { noteItem } from '../db/schema';
import type { Observation } from './observe';

type Row = typeof noteItem.$inferSelect;

export async function writeAuthorship(
	tx: Db,
	noteId: string,
	{ content, touched }: Pick<Observation, 'content' | 'touched'>
): Promise<void> {
	const rows = await tx.select().from(noteItem).where(eq(noteItem.noteId, noteId));
	const stored = new Map(rows.map((row) => [row.itemId, row]));
	const now = new Date();
	const next: Row[] = [];

	for (const seen of listed(content)) {
		const row = stored.get(seen.itemId);
		stored.delete(seen.itemId);
		const touch = touched.get(seen.itemId);
		const by = touch ? { changedBy: touch.userId, changedAt: touch.at } : {};
		if (!row) {
			const { userId = null, at = now } = touch ?? {};
			next.push({
				noteId,
				...seen,
				createdBy: userId,
				createdAt: at,
				changedBy: userId,
				changedAt: at,
				removedBy: null,
				removedAt: null
			});
		} else if (touch || row.removedAt || differs(row, seen)) {
			next.push({ ...row, ...seen, ...by, removedBy: null, removedAt: null });
		}
	}
	for (const row of stored.values()) {
		if (row.removedAt) continue;
		const touch = touched.get(row.itemId);
		next.push({ ...row, removedBy: touch?.userId ?? null, removedAt: touch?.at ?? now });
	}
	if (next.length === 0) return;
	const excluded = (column: string) => sql.raw(`excluded.${column}`);
	await tx
		.insert(noteItem)
		.values(next)
		.onConflictDoUpdate({
			target: [noteItem.noteId, noteItem.itemId],
			set: {
				kind: excluded('kind'),
				number: excluded('number'),
				symbol: excluded('symbol'),
				description: excluded('description'),
				changedBy: excluded('changed_by'),
				changedAt: excluded('changed_at'),
				removedBy: excluded('removed_by'),
				removedAt: excluded('removed_at')
			}
		});
}

type Listed = Pick<Row, 'itemId' | 'kind' | 'number' | 'symbol' | 'description'>;

const differs = (row: Row, seen: Listed) =>
	(Object.keys(seen) as (keyof Listed)[]).some((key) => row[key] !== seen[key]);

function listed(content: NoteContent): Listed[] {
	const numbers = numberItems(content.items);
	return content.items.map((item) => ({
		itemId: item.id,
		kind: item.kind,
		number: numbers.get(item.id)!,
		symbol: 'symbol' in item ? item.symbol : '',
		description: descriptionOf(item)
	}));
}

/** What an item is about, in a line. */
function descriptionOf(item: Item): string {
	const words =
		item.kind === 'section'
			? item.title
			: item.kind === 'text'
				? readableProse(item.body)
				: item.description;
	const line = words.replace(/\s+/g, ' ').trim();
	return line.length > 200 ? `${line.slice(0, 199)}…` : line;
}
