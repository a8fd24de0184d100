/** Parts of a baseline's head that are looked up or counted. */
import { inArray } from 'drizzle-orm';
import type { ItemResult } from '$lib/engine/calc/results';
import type { NoteContent } from '$lib/note/items';
import { readingsOf } from '$lib/note/readings';
import type { CheckCounts } from '$lib/note/summary';
import type { Note } from '../auth/guard';
import type { Db } from '../db';
import { user } from '../db/schema';

export async function namesOf(tx: Db, { creatorId, approverId }: Note) {
	const people = await tx
		.select({ id: user.id, name: user.name })
		.from(user)
		.where(inArray(user.id, approverId ? [creatorId, approverId] : [creatorId]));
	const name = (id: string | null) => people.find((person) => person.id === id)?.name ?? '';
	return { creator: name(creatorId), approver: name(approverId) };
}

export function summaryOf(content: NoteContent, results: readonly ItemResult[]) {
	const byId = new Map(results.map((result) => [result.id, result]));
	const checks: CheckCounts = { holds: 0, thin: 0, fails: 0, waits: 0 };
	for (const result of results) if (result.kind === 'check') checks[result.state] += 1;
	const figures = content.items.flatMap((item) => readingsOf(item, byId.get(item.id))).length;
	return { items: content.items.length, figures, checks };
}
