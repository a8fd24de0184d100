/**
 * What stands behind a name: one object for as long as an item defines it, so that formulas hold on to
 * it and read the figure without looking the name up.
 */
import { equal } from '../quantities/dimension';
import type { ValueType } from './infer';

/** How a value is typed and shown. What names it is checked anew only where this changes. */
export type Manner = { type: ValueType; unit: string; digits: number };

/** How far something moved: its figure only, or the manner too, or what it says in words. */
export type Move = 'none' | 'figure' | 'manner';

export class Slot {
	/** In SI; it says something only beside a manner. */
	si = 0;
	/** Null where there is no value. */
	manner: Manner | null = null;
	/** Where it starts that there is none. */
	roots: readonly string[];
	/** Standard uncertainty in SI; null means exact or not known. */
	uncertainty: number | null = null;
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
	}

	lack(roots: readonly string[]): void {
		const alike =
			!this.manner &&
			roots.length === this.roots.length &&
			roots.every((root, i) => root === this.roots[i]);
		if (alike) return;
		this.manner = null;
		this.uncertainty = null;
		this.roots = roots;
		this.move = 'manner';
	}

	/** How it moved since this was last asked. */
	takeMove(): Move {
		const { move } = this;
		this.move = 'none';
		return move;
	}
}

export const sameManner = (a: Manner, b: Manner) =>
	a === b ||
	(a.unit === b.unit &&
		a.digits === b.digits &&
		a.type.scale === b.type.scale &&
		equal(a.type.dimension, b.type.dimension));
