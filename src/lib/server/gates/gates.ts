/** The gates of a programme, in the order in which it passes them. */
import { asc, count, eq } from 'drizzle-orm';
import { db, type Db } from '../db';
import { baseline, gate, note, programme } from '../db/schema';
import { announce } from '../events';
import { Problem } from '../problems';

export type GateValues = { kind: string; name: string; date: string | null };

/** Gates with the number of baselines frozen at each, the first to be passed first. */
export function gatesOf(programmeId: string) {
	return db
		.select({
			id: gate.id,
			kind: gate.kind,
			name: gate.name,
			date: gate.date,
			position: gate.position,
			baselines: count(baseline.id)
		})
		.from(gate)
		.leftJoin(baseline, eq(baseline.gateId, gate.id))
		.where(eq(gate.programmeId, programmeId))
		.groupBy(gate.id)
		.orderBy(asc(gate.position));
}

export async function addGate(programmeId: string, values: GateValues): Promise<void> {
	await change(programmeId, async (tx, order) => {
		await tx.insert(gate).values({ ...values, programmeId, position: order.length });
	});
}

export async function changeGate(
	programmeId: string,
	id: string,
	values: GateValues
): Promise<void> {
	await change(programmeId, async (tx, order) => {
		known(order, id);
		await tx.update(gate).set(values).where(eq(gate.id, id));
	});
}

/** Moves a gate one place earlier or later; at the end of the line it stays. */
export async function moveGate(
	programmeId: string,
	id: string,
	direction: 'earlier' | 'later'
): Promise<void> {
	await change(programmeId, async (tx, order) => {
		const from = known(order, id);
		const to = from + (direction === 'earlier' ? -1 : 1);
		if (to < 0 || to >= order.length) return;
		order.splice(to, 0, ...order.splice(from, 1));
		await number(tx, order);
	});
}

export async function removeGate(programmeId: string, id: string): Promise<void> {
	await change(programmeId, async (tx, order) => {
		const at = known(order, id);
		const frozen = await tx
			.select({ number: note.number, revision: baseline.revision })
			.from(baseline)
			.innerJoin(note, eq(note.id, baseline.noteId))
			.where(eq(baseline.gateId, id));
		if (frozen.length > 0) {
			const which = frozen.map((one) => `${one.number} rev. ${one.revision}`).join(', ');
			throw new Problem(409, `Frozen at this gate: ${which}. A gate with baselines stays.`);
		}
		await tx.delete(gate).where(eq(gate.id, id));
		order.splice(at, 1);
		await number(tx, order);
	});
}

/** One change of a programme's gates at a time, with their ids in order. */
async function change(
	programmeId: string,
	work: (tx: Db, order: string[]) => Promise<void>
): Promise<void> {
	await db.transaction(async (tx) => {
		await tx.select().from(programme).where(eq(programme.id, programmeId)).for('update');
		const rows = await tx
			.select({ id: gate.id })
			.from(gate)
			.where(eq(gate.programmeId, programmeId))
			.orderBy(asc(gate.position));
		await work(
			tx,
			rows.map((row) => row.id)
		);
		await announce(tx, { kind: 'note', programmeId });
	});
}

function known(order: string[], id: string): number {
	const at = order.indexOf(id);
	if (at < 0) throw new Problem(404, 'This gate is not in the programme, or no longer.');
	return at;
}

async function number(tx: Db, order: string[]): Promise<void> {
	for (const [position, id] of order.entries())
		await tx.update(gate).set({ position }).where(eq(gate.id, id));
}
