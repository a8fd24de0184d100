/**
 * What the sheet reads of an item: texts as typed. The note's items (`$lib/note/items`) have these
 * fields and more; the engine knows nothing of notes.
 */
export type GivenItem = {
	id: string;
	kind: 'given';
	symbol: string;
	value: string;
	unit: string;
	uncertainty: string;
};

export type CalculationItem = {
	id: string;
	kind: 'calculation';
	symbol: string;
	expression: string;
	unit: string;
	digits: string;
};

export type CheckItem = {
	id: string;
	kind: 'check';
	left: string;
	relation: 'le' | 'ge' | 'within';
	right: string;
	tolerance: string;
	required: string;
};

export type LineModelItem = {
	id: string;
	kind: 'lineModel';
	symbol: string;
	body: 'earth' | 'mars' | 'moon' | 'ceres' | 'own' | 'moonNear' | 'moonFar';
	j2: 'without' | 'with';
	gm: string;
	radius: string;
	period: string;
	oblateness: string;
	primaryGm: string;
	distance: string;
	density: string;
	allowable: string;
	factorOfSafety: string;
	baseMode: 'lift' | 'area';
	lift: string;
	reserve: string;
	area: string;
	top: string;
};

export type SheetItem = GivenItem | CalculationItem | CheckItem | LineModelItem;

/** An edit: items written anew whole, items gone, and the order of all where it changed. */
export type SheetChange = {
	upsert?: SheetItem[];
	remove?: string[];
	/** Ids in sheet order; items that compute nothing may be among them. */
	order?: string[];
	/** Margin below which a check that holds is thin. */
	thinLimit?: number;
};
