/**
 * Standard uncertainties to first order, JCGM 100 (GUM) 5.1.2: u² = Σ (∂f/∂xᵢ · uᵢ)² over the givens xᵢ,
 * which are taken as independent of each other. Each quantity carries its row of ∂f/∂xᵢ · uᵢ, not its own
 * u, so that what two quantities have in common counts as common: a/a and a − a are exact.
 *
 * Valid where the quantities are straight enough over ± u. Left out: higher orders, correlations between
 * givens, and whether a condition still holds over ± u. Null stands for exact and for not known: a slope
 * that is not finite, or an uncertainty above 1e300.
 */
import { LARGEST } from './compile';
import type { Held } from './held';
import type { Linear } from './linear';
import { byId } from './links';
import type { Slot } from './slot';

/** Givens taken at once: rows stay short however many givens are uncertain. */
const BLOCK = 64;

/** Of the slots of one item, in SI. */
export type Found = { held: Held; uncertainties: (number | null)[] };

/** The items where an uncertainty is another now than the slots have. `order` has all, suppliers first. */
export function propagate(order: readonly Held[]): Found[] {
	const rows = new Rows();
	const isUncertain = (slot: Slot) => rows.has(slot);
	const isGiven = ({ entry }: Held) => entry.item.kind === 'given';
	// By id, so that sums do not hang on the order in which the items came.
	for (const { slots } of order.filter(isGiven).sort(byId)) rows.addGiven(slots[0]!);
	const derived = order.filter((held) => !isGiven(held));
	for (const { entry, slots } of derived) {
		entry.linear(isUncertain).forEach((linear, i) => linear && rows.add(slots[i]!, linear));
	}
	const found = rows.uncertainties();
	return derived
		.filter(({ slots }) => slots.some((slot) => slot.uncertainty !== (found.get(slot) ?? null)))
		.map((held) => ({
			held,
			uncertainties: held.slots.map((slot) => found.get(slot) ?? null)
		}));
}

class Rows {
	private rows = new Map<Slot, number>();
	/** By row: the given's uncertainty, or 0 and what it follows from. */
	private own: number[] = [];
	private from: number[][] = [];
	private slopes: number[][] = [];

	has(slot: Slot): boolean {
		return this.rows.has(slot);
	}

	addGiven(slot: Slot): void {
		if (slot.manner && slot.uncertainty) this.addRow(slot, slot.uncertainty, [], []);
	}

	add(slot: Slot, { inputs, slopes }: Linear): void {
		const from: number[] = [];
		const by: number[] = [];
		for (let i = 0; i < inputs.length; i += 1) {
			const row = this.rows.get(inputs[i]!);
			if (row === undefined || slopes[i] === 0) continue;
			from.push(row);
			by.push(slopes[i]!);
		}
		if (from.length > 0) this.addRow(slot, 0, from, by);
	}

	/** In SI, of the slots that follow from an uncertain given. */
	uncertainties(): Map<Slot, number> {
		const size = this.own.length;
		const givens = this.own.flatMap((own, row) => (own === 0 ? [] : [row]));
		const norms = Array.from({ length: size }, () => new Norm());
		const table = new Float64Array(size * Math.min(BLOCK, givens.length));
		for (let start = 0; start < givens.length; start += BLOCK) {
			const block = givens.slice(start, start + BLOCK);
			this.fill(table, block);
			for (let row = 0, at = 0; row < size; row += 1) {
				for (let i = 0; i < block.length; i += 1) norms[row]!.add(table[at++]!);
			}
		}
		const told = [...this.rows].map(([slot, row]): [Slot, number] => [slot, norms[row]!.value]);
		return new Map(told.filter(([, value]) => value > 0 && value <= LARGEST));
	}

	private fill(table: Float64Array, block: readonly number[]): void {
		const width = block.length;
		table.fill(0);
		block.forEach((row, i) => (table[row * width + i] = this.own[row]!));
		for (let row = 0; row < this.own.length; row += 1) {
			const start = row * width;
			const from = this.from[row]!;
			for (let k = 0; k < from.length; k += 1) {
				const slope = this.slopes[row]![k]!;
				const other = from[k]! * width;
				for (let i = 0; i < width; i += 1) {
					// A given that does not come in stays out, even where the slope is not finite.
					const share = table[other + i]!;
					if (share !== 0) table[start + i]! += slope * share;
				}
			}
		}
	}

	private addRow(slot: Slot, own: number, from: number[], slopes: number[]): void {
		this.rows.set(slot, this.own.length);
		this.own.push(own);
		this.from.push(from);
		this.slopes.push(slopes);
	}
}

/** Root of a sum of squares, none of which may leave the range of numbers. */
class Norm {
	private scale = 0;
	private sum = 0;

	add(share: number): void {
		if (share === 0) return;
		const size = Math.abs(share);
		if (size > this.scale) {
			this.sum = 1 + this.sum * (this.scale / size) ** 2;
			this.scale = size;
		} else this.sum += (size / this.scale) ** 2;
	}

	get value(): number {
		return this.scale * Math.sqrt(this.sum);
	}
}
