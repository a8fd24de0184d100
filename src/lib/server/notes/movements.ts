/** What last moved a check from one state to another: which edit upstream of it, by whom, when. */
import { and, eq, inArray, sql } from 'drizzle-orm';
import type { CheckResult, ItemResult } from '$lib/engine/calc/results';
import type { Item } from '$lib/note/items';
import type { LineMark } from '$lib/note/summary';
import type { Db } from '../db';
import { checkMovement } from '../db/schema';
import { announce } from '../events';
import { editTexts } from './edit-texts';
import type { Observation } from './observe';
import type { Touch } from './touches';

export type Movement = Omit<typeof checkMovement.$inferSelect, 'noteId'>;

/** Edits of one item by one person go on as long as no pause between them is longer (ms). */
const ONE_EDIT = 60_000;

type Seen = Pick<Observation, 'content' | 'touched' | 'earlier'> & { results: ItemResult[] };

/** Movements to write, and checks whose movement was taken back by going on with the same edit. */
export function findMovements(
	seen: Seen,
	marks: readonly LineMark[],
	stored: readonly Movement[]
): { write: Movement[]; drop: string[] } {
	const before = new Map(marks.map((mark) => [mark.itemId, mark.state]));
	const last = new Map(stored.map((movement) => [movement.itemId, movement]));
	const items = new Map(seen.content.items.map((item) => [item.id, item]));
	const uses = usesOf(seen.earlier, seen.results);
	// A new source or description moves nothing.
	const moving = new Map(
		[...seen.touched].filter(([id, { before }]) => {
			const texts = editTexts(before, items.get(id) ?? null);
			return texts.before !== texts.after;
		})
	);
	const write: Movement[] = [];
	const drop: string[] = [];

	for (const check of seen.results) {
		const stateBefore = check.kind === 'check' ? before.get(check.id) : undefined;
		if (check.kind !== 'check' || stateBefore === undefined) continue;
		const cause = causeOf(check, uses, moving);
		const movement = cause
			? movementBy(cause, check, stateBefore, items)
			: nobody(check, stateBefore);
		const earlier = last.get(check.id);
		if (cause && earlier && goesOn(earlier, movement)) {
			if (earlier.stateBefore === check.state) drop.push(check.id);
			else
				write.push({
					...movement,
					stateBefore: earlier.stateBefore,
					causeBefore: earlier.causeBefore
				});
		} else if (stateBefore !== check.state) write.push(movement);
	}
	return { write, drop };
}

type Cause = { itemId: string; touch: Touch };

function movementBy(
	{ itemId, touch }: Cause,
	check: CheckResult,
	stateBefore: string,
	items: ReadonlyMap<string, Item>
): Movement {
	const texts = editTexts(touch.before, items.get(itemId) ?? null);
	return {
		itemId: check.id,
		stateBefore,
		state: check.state,
		causeItemId: itemId === check.id ? null : itemId,
		causeBefore: texts.before,
		causeAfter: texts.after,
		movedBy: touch.userId,
		movedAt: touch.at
	};
}

/** Nobody edited anything that the check stands on: the note's thin limit, or a new engine. */
const nobody = (check: CheckResult, stateBefore: string): Movement => ({
	itemId: check.id,
	stateBefore,
	state: check.state,
	causeItemId: null,
	causeBefore: '',
	causeAfter: '',
	movedBy: null,
	movedAt: new Date()
});

const goesOn = (earlier: Movement, now: Movement) =>
	earlier.causeItemId === now.causeItemId &&
	earlier.movedBy === now.movedBy &&
	now.movedAt.getTime() - earlier.movedAt.getTime() < ONE_EDIT;

/** The check itself where it was edited, else what was edited last of all that it stands on. */
function causeOf(
	check: CheckResult,
	uses: ReadonlyMap<string, ReadonlySet<string>>,
	touched: ReadonlyMap<string, Touch>
): Cause | null {
	const own = touched.get(check.id);
	if (own) return { itemId: check.id, touch: own };
	const upstream = new Set(uses.get(check.id));
	for (const id of upstream) for (const further of uses.get(id) ?? []) upstream.add(further);
	return [...upstream]
		.flatMap((itemId) => {
			const touch = touched.get(itemId);
			return touch ? [{ itemId, touch }] : [];
		})
		.reduce<Cause | null>(
			(latest, one) => (latest && latest.touch.at > one.touch.at ? latest : one),
			null
		);
}

/** What each item uses, now or before the edits: an item that was removed is used by nothing now. */
function usesOf(...results: ItemResult[][]): Map<string, Set<string>> {
	const uses = new Map<string, Set<string>>();
	for (const { id, uses: used } of results.flat())
		uses.set(id, new Set([...(uses.get(id) ?? []), ...used]));
	return uses;
}

export async function writeMovements(
	tx: Db,
	noteId: string,
	seen: Seen,
	marks: readonly LineMark[]
): Promise<void> {
	const stored = await tx.select().from(checkMovement).where(eq(checkMovement.noteId, noteId));
	const { write, drop } = findMovements(seen, marks, stored);
	if (write.length > 0)
		await tx
			.insert(checkMovement)
			.values(write.map((movement) => ({ noteId, ...movement })))
			.onConflictDoUpdate({
				target: [checkMovement.noteId, checkMovement.itemId],
				set: {
					stateBefore: sql`excluded.state_before`,
					state: sql`excluded.state`,
					causeItemId: sql`excluded.cause_item_id`,
					causeBefore: sql`excluded.cause_before`,
					causeAfter: sql`excluded.cause_after`,
					movedBy: sql`excluded.moved_by`,
					movedAt: sql`excluded.moved_at`
				}
			});
	if (drop.length > 0)
		await tx
			.delete(checkMovement)
			.where(and(eq(checkMovement.noteId, noteId), inArray(checkMovement.itemId, drop)));
	if (write.length + drop.length > 0) await announce(tx, { kind: 'movements', noteId });
}
