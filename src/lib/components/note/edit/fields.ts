/** How the fields of each kind stand in an open row. */
import { MODEL_INPUTS, PLACE_FIELDS, type ModelField } from '$lib/engine/calc/model-inputs';
import type { NumberParameter } from '$lib/engine/methods/parameter';
import type { Item, ItemKind } from '$lib/note/items';

export type FieldPlan = {
	field: string;
	label: string;
	/** Expression: monospaced, with completion and underlined faults. "name" is monospaced only. */
	typed: 'words' | 'name' | 'expression';
	/** Columns of twelve. */
	span: number;
	hint?: string;
	shown?: (item: Item) => boolean;
};

const words = (field: string, label: string, span: number, hint = ''): FieldPlan => ({
	field,
	label,
	typed: 'words',
	span,
	hint
});
const name = (field: string, label: string, span: number, hint = ''): FieldPlan => ({
	...words(field, label, span, hint),
	typed: 'name'
});
const expression = (field: string, label: string, span: number, hint = ''): FieldPlan => ({
	...words(field, label, span, hint),
	typed: 'expression'
});

/** Named and explained by the method's own description. */
function input(field: ModelField, span: number): FieldPlan {
	const { label, help = '' }: NumberParameter = MODEL_INPUTS[field];
	return expression(field, label[0]!.toUpperCase() + label.slice(1), span, help);
}

const isMoon = ({ body }: Extract<Item, { kind: 'lineModel' }>) =>
	body === 'moonNear' || body === 'moonFar';

/** Whether the place is a body whose J2 is known. */
export const hasOblateness = ({ body }: Extract<Item, { kind: 'lineModel' }>) =>
	['earth', 'mars', 'moon'].includes(body);

/** What says where a line stands that stands on no body known here. */
function placed(
	place: keyof typeof PLACE_FIELDS,
	named: Partial<Record<ModelField, string>>
): FieldPlan[] {
	return PLACE_FIELDS[place].map((field) => {
		const plan = input(field, 3);
		return {
			...plan,
			label: named[field] ?? plan.label,
			hint:
				place === 'moon'
					? BLANK_STANDS_FOR[field as keyof typeof BLANK_STANDS_FOR]
					: (plan.hint ?? ''),
			shown: model((m) => (place === 'moon' ? isMoon(m) : m.body === 'own'))
		};
	});
}

const BLANK_STANDS_FOR = {
	gm: 'empty is the Moon’s',
	radius: 'empty is the Moon’s',
	primaryGm: 'empty is the Earth’s',
	distance: 'between the centres; empty is 384 400 km'
};

const model = (test: (item: Extract<Item, { kind: 'lineModel' }>) => boolean) => (item: Item) =>
	item.kind === 'lineModel' && test(item);

/** Text items have an editor of their own. */
export const PLANS: Record<Exclude<ItemKind, 'text'>, FieldPlan[]> = {
	section: [words('title', 'Title of the section', 12)],
	given: [
		name('symbol', 'Symbol', 2),
		words('description', 'What it is', 10),
		name('value', 'Value', 3),
		name('unit', 'Unit', 2),
		name('uncertainty', 'Standard uncertainty', 2, 'in the unit of the value; empty is exact'),
		words('source', 'Source', 5)
	],
	calculation: [
		name('symbol', 'Symbol', 2),
		words('description', 'What it is', 6),
		name('unit', 'Show in', 2, 'a unit; empty lets it choose'),
		name('digits', 'Digits', 2, 'significant; empty is 4'),
		expression('expression', 'Expression', 12)
	],
	check: [
		words('description', 'What must hold', 12),
		expression('left', 'Left side', 5),
		expression('right', 'Right side', 5),
		{
			...expression('tolerance', 'Tolerance ±', 3),
			shown: (item) => item.kind === 'check' && item.relation === 'within'
		},
		expression('required', 'Required margin', 3, 'empty is 0')
	],
	lineModel: [
		name('symbol', 'Name', 2, 'outputs are name.taper …'),
		words('description', 'What it is', 6),
		...placed('own', { gm: 'Gravitational parameter', radius: 'Equatorial radius' }),
		...placed('moon', { gm: 'Gravitational parameter of the moon', radius: 'Radius of the moon' }),
		input('density', 4),
		input('allowable', 4),
		input('factorOfSafety', 4),
		{ ...input('lift', 4), shown: model((m) => m.baseMode === 'lift') },
		{ ...input('reserve', 4), shown: model((m) => m.baseMode === 'lift') },
		{ ...input('area', 4), shown: model((m) => m.baseMode === 'area') },
		input('top', 4)
	],
	evidence: [words('description', 'What it shows', 12)]
};

export const RELATIONS = [
	{ value: 'le', label: '≤  at most' },
	{ value: 'ge', label: '≥  at least' },
	{ value: 'within', label: 'within ±' }
];

export const OBLATENESS = [
	{ value: 'without', label: 'left out' },
	{ value: 'with', label: 'with it' }
];

export const BASE_MODES = [
	{ value: 'lift', label: 'from the lift' },
	{ value: 'area', label: 'given as an area' }
];
