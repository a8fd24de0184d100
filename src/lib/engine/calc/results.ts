/** What the sheet answers for each item. Plain data: it crosses from a worker and is kept in baselines. */

import type { Dimension } from '../quantities/dimension';

export type { Dimension };

/** A value that could be computed. Never NaN or Infinity. */
export type Quantity = {
	/** In coherent SI units. */
	si: number;
	dimension: Dimension;
	/** The value in `unit`, the one to show. */
	value: number;
	/** Unit to show, as people type it; empty for a pure number. */
	unit: string;
	/** Standard uncertainty in `unit`; null means exact or not known. */
	uncertainty: number | null;
	/** Significant digits to show. */
	digits: number;
};

/** Values of one dimension, in order. */
export type Listed = {
	/** The first of them in coherent SI units, all where there are no more than 1 000. */
	si: number[];
	dimension: Dimension;
	/** Unit of everything below, as people type it. */
	unit: string;
	/** Significant digits to show. */
	digits: number;
	count: number;
	/** The same first of them in `unit`, those to show. */
	values: number[];
	/** Standard uncertainty of each of these; null means exact or not known, here for all of them. */
	uncertainties: (number | null)[] | null;
	least: number;
	greatest: number;
	mean: number;
};

/** Where in the typed text a fault lies, as offsets [from, to). */
export type Span = { field: string; from: number; to: number };

export type FaultCode =
	| 'syntax'
	| 'unknown-symbol'
	| 'unknown-unit'
	| 'unknown-function'
	| 'ambiguous-name'
	| 'dimension'
	| 'cycle'
	| 'double-definition'
	| 'bad-symbol'
	| 'bad-number'
	| 'division-by-zero'
	| 'domain'
	| 'beyond-any-build'
	| 'not-allowed'
	| 'too-long'
	| 'refused';

/** Why there is no value, in words that name the thing and the reason. */
export type Fault = {
	code: FaultCode;
	/** A sentence for the person, plain text. */
	message: string;
	/** What to change, where that can be said; empty otherwise. */
	remedy: string;
	span: Span | null;
	/** Names near an unknown one, best first. */
	near: string[];
	/** Other items that it is about: where else a symbol is defined, what else stands in a cycle. */
	items: string[];
};

/** A quantity, a list of values, or the reason why there is none. */
export type Outcome =
	| { state: 'value'; quantity: Quantity }
	| { state: 'list'; list: Listed }
	/** Nothing typed yet. */
	| { state: 'blank' }
	/** Something upstream has no value: the symbols waited for, nearest first, and where it starts. */
	| { state: 'waits'; for: string[]; rootIds: string[] }
	| { state: 'fault'; faults: Fault[] };

type Common = {
	id: string;
	/** Ids of items that this one names, and of those that name it, in sheet order. */
	uses: string[];
	usedIn: string[];
};

export type QuantityResult = Common & {
	kind: 'given' | 'calculation';
	symbol: string;
	outcome: Outcome;
	/** The formula set in TeX; empty for a given or where it cannot be parsed. */
	tex: string;
	/** The symbol set in TeX. */
	symbolTex: string;
};

export type CheckResult = Common & {
	kind: 'check';
	state: 'holds' | 'thin' | 'fails' | 'waits';
	left: Outcome;
	right: Outcome;
	tolerance: Outcome | null;
	/** Required margin. */
	required: number;
	/** Null when it waits. */
	margin: {
		/** "ratio" is allowed over actual less one; "difference" is in `unit`. */
		kind: 'ratio' | 'difference';
		value: number;
		unit: string;
		/** Standard uncertainty in `unit`; null means exact or not known. Baselines of engine 1 lack it. */
		uncertainty?: number | null;
		/** The margin as a pure number: what the thin limit and the width of the line go by. */
		relative: number;
	} | null;
	/** For a failing check: by how much, in a unit to show, e.g. "2.8 GPa". */
	shortBy: { value: number; unit: string } | null;
	/** Why it waits, where a side is at fault. */
	faults: Fault[];
	/** The condition set in TeX with its figures. */
	tex: string;
};

/** One output of a line model, a quantity that other items name as `symbol.name`. */
export type ModelOutput = {
	name: string;
	symbolTex: string;
	description: string;
	outcome: Outcome;
};

/** The line over height, for silhouette and stress chart. */
export type LineProfile = {
	/** Height above the surface, m. */
	height: number[];
	/** Section, m². */
	area: number[];
	/** Stress, Pa. */
	stress: number[];
	/** Tension, N. */
	tension: number[];
	/** Height of the balance radius, m. */
	synchronous: number;
};

export type LineModelResult = Common & {
	kind: 'lineModel';
	symbol: string;
	/** Faults of the inputs by field, and refusals of the model under the field "". */
	faults: { field: string; fault: Fault }[];
	/** What it waits for; empty when it does not. */
	waitsFor: string[];
	inputs: { field: string; outcome: Outcome; tex: string }[];
	outputs: ModelOutput[];
	profile: LineProfile | null;
	/** Words that stand beside the results: what is left out, what to heed. */
	warnings: string[];
};

export type ItemResult = QuantityResult | CheckResult | LineModelResult;
