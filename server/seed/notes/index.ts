import type { Item } from '../../../src/lib/note/items';

/** An edit made after the baseline: one field of one item, typed anew by somebody. */
export type LaterEdit = { by: string; item: string; field: string; value: string };

export type DemoRemark = {
	pinned: 'before the baseline' | 'since';
	by: string;
	item: string;
	body: string;
	replies: { by: string; body: string }[];
	settledBy?: string;
};

export type DemoNote = {
	title: string;
	department: string;
	technicalReference: string;
	creator: string;
	approver: string;
	thinLimit: string;
	items: Item[];
	/** Whether it was frozen at the programme's first gate, with what was waived then. */
	frozen: false | { waivers: { itemId: string; reason: string }[] };
	/** What has been edited since. */
	edits: LaterEdit[];
	/** Words added since at the end of a text. */
	sentences?: { by: string; item: string; words: string }[];
	/** Items written since, each below another. */
	additions: { by: string; after: string; item: Item }[];
	remarks: DemoRemark[];
	/** Files put into evidence items, from server/seed/files. */
	files: { item: string; name: string; by: string }[];
};

/** Gates lie some days from the day on which the demo is written. */
export type DemoGate = { kind: string; name: string; inDays: number };

export type DemoProgramme = {
	code: 'CL' | 'ML';
	title: string;
	summary: string;
	gates: DemoGate[];
	notes: DemoNote[];
};
