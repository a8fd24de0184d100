/**
 * What stands behind a name: one object for as long as an item defines it, so that formulas hold on to
 * it and read the figure without looking the name up.
 */
import { equal } from '../quantities/dimension';
import type { ValueType } from './value-type';

/** How a value is typed and shown. What names it is checked anew only where this changes. */
export type Manner = { type: ValueType; unit: string; digits: number };

/** How far something moved: its figure only, or the manner too, or what it says in words. */
export type Move = 'none' | 'figure' | 'manner';

/** Of one value, or of each value of a list. */
export type Uncertainty = number | Float64Array | null;

export class Slot {
	/** In SI; it says something only beside a manner, and not of a list. */
	si = 0;
	/** The values of a list, in SI; null for one value. */
	list: Float64Array | null = null;
	/** Null where there is no value. */
	manner: Manner | null = null;
	/** Where it starts that there is none. */
	roots: readonly string[];
	/** Standard uncertainty in SI; null means exact or not known, and that it is a list. */
	uncertainty: number | null = null;
	/** The same of each value of a list, 0 where it is exact or not known. */
	uncertainties: Float64Array | null = null;
	/** Nothing that names it has seen a new slot: what stood there before may have been of another kind. */
	private move: Move = 'manner';

	constructor(id: string) {
		this.roots = [id];
	}

	give(si: number, manner: Manner): void {
		if (!this.manner || !sameManner(this.manner, manner)) {
			this.move = 'manner';
			this.manner = manner;
		}
		if (si !== this.si && this.move === 'none') this.move = 'figure';
		this.si = si;
		this.list = null;
	}

	giveList(list: Float64Array, manner: Manner): void {
		const before = this.list;
		this.give(0, manner);
		this.list = list;
		if (before && !sameValues(before, list) && this.move === 'none') this.move = 'figure';
	}

	lack(roots: readonly string[]): void {
		const alike =
			!this.manner &&
			roots.length === this.roots.length &&
			roots.every((root, i) => root === this.roots[i]);
		if (alike) return;
		this.manner = null;
		this.list = null;
		this.learn(null);
		this.roots = roots;
		this.move = 'manner';
	}

	learn(uncertainty: Uncertainty): void {
		const isList = uncertainty instanceof Float64Array;
		this.uncertainty = isList ? null : uncertainty;
		this.uncertainties = isList ? uncertainty : null;
	}

	knows(uncertainty: Uncertainty): boolean {
		if (!(uncertainty instanceof Float64Array))
			return this.uncertainty === uncertainty && !this.uncertainties;
		return this.uncertainties !== null && sameValues(this.uncertainties, uncertainty);
	}

	/** How it moved since this was last asked. */
	takeMove(): Move {
		const { move } = this;
		this.move = 'none';
		return move;
	}
}

export const sameValues = (a: Float64Array, b: Float64Array) =>
	a.length === b.length && a.every((value, i) => value === b[i]);

export const sameManner = (a: Manner, b: Manner) =>
	a === b ||
	(a.unit === b.unit &&
		a.digits === b.digits &&
		a.type.scale === b.type.scale &&
		a.type.list === b.type.list &&
		equal(a.type.dimension, b.type.dimension));
