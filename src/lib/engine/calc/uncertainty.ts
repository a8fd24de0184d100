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
import type { Carried, Derived, Linear } from './linear';
import { byId } from './links';
import { Norm } from './norm';
import type { Slot, Uncertainty } from './slot';

/** Givens taken at once: rows stay short however many givens are uncertain. */
const BLOCK = 64;

/** Rows of all lists together; what goes beyond is not known. */
const MOST_LISTED = 20_000;

/** Of the slots of one item, in SI. */
export type Found = { held: Held; uncertainties: Uncertainty[] };

/** The items where an uncertainty is another now than the slots have. `order` has all, suppliers first. */
export function propagate(order: readonly Held[]): Found[] {
	const rows = new Rows();
	const isUncertain = (slot: Slot) => rows.has(slot);
	const isGiven = ({ entry }: Held) => entry.item.kind === 'given';
	// By id, so that sums do not hang on the order in which the items came.
	for (const { slots } of order.filter(isGiven).sort(byId)) rows.addGiven(slots[0]!);
	const derived = order.filter((held) => !isGiven(held));
	for (const { entry, slots } of derived) {
		entry.linear(isUncertain).forEach((from, i) => from && rows.add(slots[i]!, from));
	}
	const found = rows.uncertainties();
	const of = (slot: Slot) => found.get(slot) ?? null;
	return derived
		.filter(({ slots }) => slots.some((slot) => !slot.knows(of(slot))))
		.map((held) => ({ held, uncertainties: held.slots.map(of) }));
}

/** The rows of a slot: one, or one for each value of a list. */
type Span = { from: number; count: number };

class Rows {
	private spans = new Map<Slot, Span>();
	/** Lists too long to follow, and what comes of them. */
	private lost = new Set<Slot>();
	private listed = 0;
	/** By row: the given's uncertainty, or 0 and what it follows from. */
	private own: number[] = [];
	private from: number[][] = [];
	private slopes: number[][] = [];
	/** By their first row. */
	private carried = new Map<number, { carried: Carried; inputs: (Span | null)[] }>();

	has(slot: Slot): boolean {
		return this.spans.has(slot) || this.lost.has(slot);
	}

	addGiven(slot: Slot): void {
		if (slot.manner && slot.uncertainty) this.addRow(slot, slot.uncertainty, [], []);
	}

	add(slot: Slot, derived: Derived): void {
		if (this.isLost(derived)) this.lost.add(slot);
		else if ('carry' in derived) this.addCarried(slot, derived);
		else this.addLinear(slot, derived);
	}

	private isLost(derived: Derived): boolean {
		if (this.lost.size === 0) return false;
		return derived.inputs.some(
			(input, i) => this.lost.has(input) && ('carry' in derived || derived.slopes[i] !== 0)
		);
	}

	private addLinear(slot: Slot, { inputs, slopes }: Linear): void {
		const from: number[] = [];
		const by: number[] = [];
		for (let i = 0; i < inputs.length; i += 1) {
			const span = this.spans.get(inputs[i]!);
			if (span === undefined || slopes[i] === 0) continue;
			from.push(span.from);
			by.push(slopes[i]!);
		}
		if (from.length > 0) this.addRow(slot, 0, from, by);
	}

	private addCarried(slot: Slot, carried: Carried): void {
		const { count } = carried;
		const inputs = carried.inputs.map((input) => this.spans.get(input) ?? null);
		if (inputs.every((span) => !span)) return;
		this.listed += count;
		if (this.listed > MOST_LISTED) {
			this.lost.add(slot);
			return;
		}
		this.carried.set(this.own.length, { carried, inputs });
		this.spans.set(slot, { from: this.own.length, count });
		for (let i = 0; i < count; i += 1) this.pushRow(0, [], []);
	}

	/** In SI, of the slots that follow from an uncertain given. */
	uncertainties(): Map<Slot, number | Float64Array> {
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
		const known = (row: number) => {
			const { value } = norms[row]!;
			return value <= LARGEST ? value : 0;
		};
		const told = new Map<Slot, number | Float64Array>();
		for (const [slot, { from, count }] of this.spans) {
			const values = Float64Array.from({ length: count }, (_, i) => known(from + i));
			if (values.every((value) => value === 0)) continue;
			told.set(slot, slot.list ? values : values[0]!);
		}
		return told;
	}

	private fill(table: Float64Array, block: readonly number[]): void {
		const width = block.length;
		table.fill(0);
		block.forEach((row, i) => (table[row * width + i] = this.own[row]!));
		for (let row = 0; row < this.own.length; row += 1) {
			const start = row * width;
			const carried = this.carried.get(row);
			if (carried) table.set(this.carry(table, width, carried) ?? [], start);
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

	private carry(
		table: Float64Array,
		width: number,
		{ carried, inputs }: { carried: Carried; inputs: (Span | null)[] }
	): Float64Array | null {
		const shares = inputs.map(
			(span) => span && table.subarray(span.from * width, (span.from + span.count) * width)
		);
		return carried.carry(shares, width);
	}

	private addRow(slot: Slot, own: number, from: number[], slopes: number[]): void {
		this.spans.set(slot, { from: this.own.length, count: 1 });
		this.pushRow(own, from, slopes);
	}

	private pushRow(own: number, from: number[], slopes: number[]): void {
		this.own.push(own);
		this.from.push(from);
		this.slopes.push(slopes);
	}
}
