/** What one item sees of the others while it is evaluated. */
import type { ValueType } from './infer';

/** What stands behind a name. */
export type Supply =
	| { state: 'value'; si: number; type: ValueType; unit: string; digits: number }
	/** Defined, but without a value; where that starts. */
	| { state: 'missing'; roots: readonly string[] };

export type Scope = {
	supply(name: string): Supply | 'unknown' | 'model';
	/** Whether the note defines the name. */
	defines(name: string): boolean;
	/** Names like this one, best first. */
	near(name: string): string[];
};
