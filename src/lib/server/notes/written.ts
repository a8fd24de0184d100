/** What the server wrote down about a note's items and checks, as the API gives it. */
import { and, asc, eq } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { db } from '../db';
import { checkMovement, noteItem, user } from '../db/schema';

const creator = alias(user, 'creator');
const changer = alias(user, 'changer');
const remover = alias(user, 'remover');
const mover = alias(user, 'mover');

/** Who wrote which item, removed ones among them. */
export async function authorshipOf(noteId: string) {
	const rows = await db
		.select({
			item: noteItem,
			createdBy: { id: creator.id, name: creator.name },
			changedBy: { id: changer.id, name: changer.name },
			removedBy: { id: remover.id, name: remover.name }
		})
		.from(noteItem)
		.leftJoin(creator, eq(creator.id, noteItem.createdBy))
		.leftJoin(changer, eq(changer.id, noteItem.changedBy))
		.leftJoin(remover, eq(remover.id, noteItem.removedBy))
		.where(eq(noteItem.noteId, noteId))
		.orderBy(asc(noteItem.createdAt), asc(noteItem.itemId));
	return rows.map(({ item, ...people }) => ({
		itemId: item.itemId,
		kind: item.kind,
		number: item.number,
		symbol: item.symbol,
		description: item.description,
		...people,
		createdAt: item.createdAt.toISOString(),
		changedAt: item.changedAt.toISOString(),
		removedAt: item.removedAt?.toISOString() ?? null
	}));
}

export type ItemAuthorship = Awaited<ReturnType<typeof authorshipOf>>[number];

/** What last moved each check. The cause has the number and symbol it had when last seen. */
export async function movementsOf(noteId: string) {
	const rows = await db
		.select({
			movement: checkMovement,
			cause: { number: noteItem.number, symbol: noteItem.symbol, kind: noteItem.kind },
			movedBy: { id: mover.id, name: mover.name }
		})
		.from(checkMovement)
		.leftJoin(mover, eq(mover.id, checkMovement.movedBy))
		.leftJoin(
			noteItem,
			and(eq(noteItem.noteId, checkMovement.noteId), eq(noteItem.itemId, checkMovement.causeItemId))
		)
		.where(eq(checkMovement.noteId, noteId));
	return rows.map(({ movement, cause, movedBy }) => ({
		itemId: movement.itemId,
		stateBefore: movement.stateBefore,
		state: movement.state,
		/** The edited item upstream; null when the check itself was edited, or nothing it stands on. */
		cause: movement.causeItemId && cause ? { itemId: movement.causeItemId, ...cause } : null,
		before: movement.causeBefore,
		after: movement.causeAfter,
		movedBy,
		movedAt: movement.movedAt.toISOString()
	}));
}

export type CheckMovement = Awaited<ReturnType<typeof movementsOf>>[number];
