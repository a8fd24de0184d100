/**
 * How a method describes what goes in and what comes out. From the one description come the checks at
 * the door, the JSON schema of the API, the documentation page and the forms of the note's items; the
 * types of a method's inputs and outputs are inferred from it.
 */
import type { Dimension } from '../quantities/dimension';

/** A figure in SI; where it is above 1e300 its decimal logarithm. */
export type Told = number | { log10: number };

type About = {
	/** What it is, as a form names it, e.g. "factor of safety". */
	label: string;
	/** The trade's symbol, Unicode, e.g. "σ_d". */
	symbol?: string;
	/** What to know when filling it in, or reading it. */
	help?: string;
};

/** Bounds in SI; `above` and `below` are excluded themselves. */
export type Range = { above?: number; least?: number; below?: number; most?: number };

export type NumberParameter = About & {
	kind: 'number';
	/** Null where it is that of what the figure is about, e.g. of an output named beside it. */
	dimension: Dimension | null;
	/** The unit that forms and tables show, e.g. "GPa"; values are in SI all the same. */
	unit: string;
	range: Range;
	default?: number;
	optional?: true;
};

export type IntegerParameter = About & {
	kind: 'integer';
	range: Range;
	default?: number;
	optional?: true;
};

export type FlagParameter = About & { kind: 'flag'; default: boolean };

export type ChoiceParameter = About & {
	kind: 'choice';
	/** What may be chosen, with the words for it. */
	options: Readonly<Record<string, string>>;
	default?: string;
	optional?: true;
};

export type TextParameter = About & { kind: 'text'; longest: number; optional?: true };

export type ListParameter = About & {
	kind: 'list';
	of: Parameter;
	fewest: number;
	most: number;
	optional?: true;
};

/** Named parts, e.g. one point mass. */
export type GroupParameter = About & { kind: 'group'; fields: Parameters; optional?: true };

/** One of several groups; which one is told by `kind`. */
export type VariantParameter = About & {
	kind: 'variant';
	cases: Readonly<Record<string, { label: string; fields: Parameters }>>;
};

/** A figure that may be beyond any build. Outputs only. */
export type ToldParameter = About & { kind: 'told'; dimension: Dimension | null; unit: string };

/** An object that another description tells of: the input of a method that is named beside it. */
export type OpenParameter = About & { kind: 'open' };

export type Parameter =
	| NumberParameter
	| IntegerParameter
	| FlagParameter
	| ChoiceParameter
	| TextParameter
	| ListParameter
	| GroupParameter
	| VariantParameter
	| ToldParameter
	| OpenParameter;

export type Parameters = Readonly<Record<string, Parameter>>;

/** The value that a parameter stands for, once checked and its defaults filled in. */
export type ValueOf<P> = P extends { optional: true } ? Required<P> | undefined : Required<P>;

type Required<P> = P extends { kind: 'number' | 'integer' }
	? number
	: P extends { kind: 'flag' }
		? boolean
		: P extends { kind: 'choice'; options: infer O }
			? keyof O & string
			: P extends { kind: 'text' }
				? string
				: P extends { kind: 'told' }
					? Told
					: P extends { kind: 'open' }
						? Readonly<Record<string, unknown>>
						: P extends { kind: 'list'; of: infer Q }
							? ValueOf<Q>[]
							: P extends { kind: 'group'; fields: infer F }
								? ValuesOf<F>
								: P extends { kind: 'variant'; cases: infer C }
									? {
											[K in keyof C]: { kind: K } & (C[K] extends { fields: infer F }
												? ValuesOf<F>
												: never);
										}[keyof C]
									: never;

export type ValuesOf<F> = { [K in keyof F]: ValueOf<F[K]> };

type Given<P, Preset extends keyof P> = Omit<P, 'kind' | Preset> &
	Partial<Pick<P, Preset & keyof P>>;

/** A quantity; its range defaults to any finite number. */
export const quantity = <const P extends Given<NumberParameter, 'range'>>(about: P) => ({
	range: {},
	...about,
	kind: 'number' as const
});

export const integer = <const P extends Given<IntegerParameter, 'range'>>(about: P) => ({
	range: {},
	...about,
	kind: 'integer' as const
});

export const flag = <const P extends Given<FlagParameter, never>>(about: P) => ({
	...about,
	kind: 'flag' as const
});

export const choice = <const P extends Given<ChoiceParameter, never>>(about: P) => ({
	...about,
	kind: 'choice' as const
});

export const text = <const P extends Given<TextParameter, never>>(about: P) => ({
	...about,
	kind: 'text' as const
});

export const list = <const P extends Given<ListParameter, never>>(about: P) => ({
	...about,
	kind: 'list' as const
});

export const group = <const P extends Given<GroupParameter, never>>(about: P) => ({
	...about,
	kind: 'group' as const
});

export const variant = <const P extends Given<VariantParameter, never>>(about: P) => ({
	...about,
	kind: 'variant' as const
});

export const told = <const P extends Given<ToldParameter, never>>(about: P) => ({
	...about,
	kind: 'told' as const
});

export const open = <const P extends Given<OpenParameter, never>>(about: P) => ({
	...about,
	kind: 'open' as const
});
