/**
 * The kinds of item and their fields: one zod schema per kind is the only description of it. The
 * document (Yjs), its projection, the interchange JSON, the API and a baseline's content follow it.
 *
 * Fields that two people may type at once are Y.Text in the document and plain strings here; a choice
 * is a plain value in both; prose is a Y.XmlFragment; evidence files are a Y.Map by file id.
 */
// The small form of zod: the same schemas at a fifth of the script in the browser.
import * as z from 'zod/mini';
import { proseSchema } from './prose';

/** Longest text of one field; what a document holds beyond it is cut. */
export const LONGEST_TYPED = 4000;

const typed = z.string().check(z.maxLength(LONGEST_TYPED));
/** A field that earlier versions did not have: blank where it is missing. */
const added = z._default(typed, '');
export const itemIdSchema = z.string().check(z.minLength(1), z.maxLength(64));
const base = { id: itemIdSchema };

export const sectionSchema = z.object({ ...base, kind: z.literal('section'), title: typed });

export const textSchema = z.object({ ...base, kind: z.literal('text'), body: proseSchema });

export const givenSchema = z.object({
	...base,
	kind: z.literal('given'),
	symbol: typed,
	description: typed,
	/** A number as typed, e.g. "110" or "1.2e-3". */
	value: typed,
	unit: typed,
	/** Standard uncertainty in the unit of the value; empty means exact. */
	uncertainty: typed,
	source: typed,
	/** The quantity of a baseline that it is taken from, see `taken.ts`; empty where it is typed. */
	taken: z._default(z.string().check(z.maxLength(300)), '')
});

export const calculationSchema = z.object({
	...base,
	kind: z.literal('calculation'),
	symbol: typed,
	description: typed,
	expression: typed,
	/** Unit to show the value in; empty lets the engine choose. */
	unit: typed,
	/** Significant digits to show, as typed; empty means 4. */
	digits: typed
});

export const relationSchema = z.enum(['le', 'ge', 'within']);

export const checkSchema = z.object({
	...base,
	kind: z.literal('check'),
	description: typed,
	left: typed,
	/** left ≤ right, left ≥ right, or left within right ± tolerance. */
	relation: relationSchema,
	right: typed,
	tolerance: typed,
	/** Required margin; empty means 0. */
	required: typed
});

/** A body known here, one of one's own, or a moon with its primary: the line towards it or away from it. */
export const bodySchema = z.enum(['earth', 'mars', 'moon', 'ceres', 'own', 'moonNear', 'moonFar']);
export const oblatenessSchema = z.enum(['without', 'with']);
export const baseModeSchema = z.enum(['lift', 'area']);

export const lineModelSchema = z.object({
	...base,
	kind: z.literal('lineModel'),
	/** Name before the dot: symbol "line" gives `line.taper`. */
	symbol: typed,
	description: typed,
	body: bodySchema,
	/** Whether J2 of a known body counts. */
	j2: z._default(oblatenessSchema, 'without'),
	/** Of a body of one's own, and of a moon, whose blanks stand for the Moon and the Earth. */
	gm: added,
	radius: added,
	period: added,
	oblateness: added,
	primaryGm: added,
	distance: added,
	density: typed,
	allowable: typed,
	factorOfSafety: typed,
	/** Whether the section at the anchor follows from a lift or is given. */
	baseMode: baseModeSchema,
	lift: typed,
	/** Reserve of lift as a fraction; empty means 0. */
	reserve: typed,
	area: typed,
	/** Height of the top above the surface. */
	top: typed
});

export const evidenceFileSchema = z.object({
	fileId: z.string(),
	name: z.string(),
	mediaType: z.string(),
	size: z.number(),
	sha256: z.string()
});

export type EvidenceFile = z.infer<typeof evidenceFileSchema>;

export const evidenceSchema = z.object({
	...base,
	kind: z.literal('evidence'),
	description: typed,
	files: z.array(evidenceFileSchema)
});

/** The schema of each kind, for looking up a single field. */
export const ITEM_SCHEMAS = {
	section: sectionSchema,
	text: textSchema,
	given: givenSchema,
	calculation: calculationSchema,
	check: checkSchema,
	lineModel: lineModelSchema,
	evidence: evidenceSchema
};

export const itemSchema = z.discriminatedUnion('kind', [
	sectionSchema,
	textSchema,
	givenSchema,
	calculationSchema,
	checkSchema,
	lineModelSchema,
	evidenceSchema
]);

export type Item = z.infer<typeof itemSchema>;
export type ItemKind = Item['kind'];
export type ItemOf<K extends ItemKind> = Extract<Item, { kind: K }>;

export const noteContentSchema = z.object({
	format: z.literal('holdfast-note', 'A note in interchange has the format “holdfast-note”.'),
	version: z.literal(
		1,
		'The version of the format known here is 1; it is described in docs/interchange.md and by GET /api/v1/schemas/note.'
	),
	/** Margin below which a check that holds is called thin, as typed. */
	thinLimit: typed,
	items: z.array(itemSchema)
});
export type NoteContent = z.infer<typeof noteContentSchema>;

/** How each field of a kind is held in the document. */
export type FieldForm = 'typed' | 'choice' | 'prose' | 'files';

type FieldsOf<K extends ItemKind> = {
	[F in Exclude<keyof ItemOf<K>, 'id' | 'kind'>]: FieldForm;
};

export const FIELDS: { [K in ItemKind]: FieldsOf<K> } = {
	section: { title: 'typed' },
	text: { body: 'prose' },
	given: {
		symbol: 'typed',
		description: 'typed',
		value: 'typed',
		unit: 'typed',
		uncertainty: 'typed',
		source: 'typed',
		taken: 'choice'
	},
	calculation: {
		symbol: 'typed',
		description: 'typed',
		expression: 'typed',
		unit: 'typed',
		digits: 'typed'
	},
	check: {
		description: 'typed',
		left: 'typed',
		relation: 'choice',
		right: 'typed',
		tolerance: 'typed',
		required: 'typed'
	},
	lineModel: {
		symbol: 'typed',
		description: 'typed',
		body: 'choice',
		j2: 'choice',
		gm: 'typed',
		radius: 'typed',
		period: 'typed',
		oblateness: 'typed',
		primaryGm: 'typed',
		distance: 'typed',
		density: 'typed',
		allowable: 'typed',
		factorOfSafety: 'typed',
		baseMode: 'choice',
		lift: 'typed',
		reserve: 'typed',
		area: 'typed',
		top: 'typed'
	},
	evidence: { description: 'typed', files: 'files' }
};

/** A new item of a kind before anybody has typed. */
export const BLANK: { [K in ItemKind]: Omit<ItemOf<K>, 'id'> } = {
	section: { kind: 'section', title: '' },
	text: { kind: 'text', body: { type: 'doc', content: [] } },
	given: {
		kind: 'given',
		symbol: '',
		description: '',
		value: '',
		unit: '',
		uncertainty: '',
		source: '',
		taken: ''
	},
	calculation: {
		kind: 'calculation',
		symbol: '',
		description: '',
		expression: '',
		unit: '',
		digits: ''
	},
	check: {
		kind: 'check',
		description: '',
		left: '',
		relation: 'le',
		right: '',
		tolerance: '',
		required: ''
	},
	lineModel: {
		kind: 'lineModel',
		symbol: '',
		description: '',
		body: 'earth',
		j2: 'without',
		gm: '',
		radius: '',
		period: '',
		oblateness: '',
		primaryGm: '',
		distance: '',
		density: '',
		allowable: '',
		factorOfSafety: '',
		baseMode: 'lift',
		lift: '',
		reserve: '',
		area: '',
		top: ''
	},
	evidence: { kind: 'evidence', description: '', files: [] }
};

/** What people call each kind. */
export const KIND_NAMES: Record<ItemKind, string> = {
	section: 'Section',
	text: 'Text',
	given: 'Given',
	calculation: 'Calculation',
	check: 'Check',
	lineModel: 'Line model',
	evidence: 'Evidence'
};
