/** One typed expression: parsed once, its dimension checked when what it names changes, then run on floats. */
import { significant } from '../quantities/number';
import { equal, isPure } from '../quantities/dimension';
import { compile, type Program } from './compile';
import { Refusal } from './faults';
import { notSingle } from './dimension-refusals';
import { compileGradient, type Gradient } from './gradient';
import { Inputs, type Figures } from './figures';
import { inferType } from './infer';
import type { ValueType } from './value-type';
import type { Carried, Derived } from './linear';
import { compileLists, hasList, type ListProgram } from './lists';
import { ambiguousName, modelName, unknownName } from './name-refusals';
import { parse, type Parsed } from './parse';
import { asTex } from './print';
import type { Fault } from './results';
import type { Scope } from './scope';
import { sameManner, type Manner, type Slot } from './slot';
import { leaves, type Expr } from './tree';

/** Unit and digits where something in it had them. */
export type FormulaValue = {
	state: 'value';
	/** 0 for a list. */
	si: number;
	/** In SI; null for one value. Only a formula that may be a list comes to one. */
	list: Float64Array | null;
	type: ValueType;
	unit: string | null;
	digits: number | null;
};

export type FormulaOutcome =
	| FormulaValue
	| { state: 'blank' }
	| { state: 'waits'; for: string[]; rootIds: string[] }
	| { state: 'fault'; faults: Fault[] };

export class Formula {
	readonly blank: boolean;
	readonly tex: string;
	/** Every name that others may define: symbols, and units that must not be symbols. */
	readonly mentions: readonly string[];
	readonly names: readonly string[];
	/** What it came to when it was evaluated last; a figure that was refreshed since is for the asker to keep. */
	outcome: FormulaOutcome = { state: 'blank' };
	private hasValue = false;
	private parsed: Parsed | null = null;
	private fault: Fault | null = null;
	private program: Program | null = null;
	/** Takes the place of the program where lists stand in the expression. */
	private lists: ListProgram | null = null;
	private gradient: Gradient | null = null;
	/** What stands behind the names, and the manners for which the type below was found. */
	private inputs: Slot[] = [];
	private inferredFor: Manner[] = [];
	private type: ValueType | Refusal | null = null;
	private unit: string | null = null;
	private digits: number | null = null;

	constructor(
		text: string,
		private field: string,
		private takesLists = false
	) {
		this.blank = text.trim() === '';
		if (!this.blank) {
			try {
				this.parsed = parse(text);
			} catch (error) {
				this.fault = asFault(error, field);
			}
		}
		this.names = this.parsed?.names ?? [];
		this.mentions = [...this.names, ...(this.parsed?.unitNames.map(({ name }) => name) ?? [])];
		this.tex = this.parsed ? asTex(this.parsed.expr) : '';
	}

	/** A bare 0, which has whatever dimension stands beside it. */
	get isZero(): boolean {
		const expr = this.parsed?.expr;
		return expr?.kind === 'number' && expr.value === 0;
	}

	/** A number written out, with or without its unit: it needs no figure beside it. */
	get isFigure(): boolean {
		const kind = this.parsed?.expr.kind;
		return kind === 'number' || kind === 'literal';
	}

	/** Looks every name up, checks dimensions where they may have changed, and finds the figure or why there is none. */
	evaluate(scope: Scope): FormulaOutcome {
		this.outcome = this.evaluated(scope);
		this.hasValue = this.outcome.state === 'value';
		return this.outcome;
	}

	/**
	 * The figure anew where the names stand for what they stood for, in the same manner. Null where that
	 * does not do, and `evaluate` has to tell.
	 */
	refresh(): number | null {
		if (!this.hasValue || this.lists) return null;
		try {
			return this.figure();
		} catch {
			return null;
		}
	}

	/** How the figure follows from what is named; null where nothing of that is uncertain. */
	linear(isUncertain: (slot: Slot) => boolean): Derived | null {
		const { parsed, inputs } = this;
		if (!parsed || !this.hasValue || !inputs.some(isUncertain)) return null;
		if (this.lists) return this.carried(this.lists);
		this.gradient ??= compileGradient(parsed.expr, this.names);
		const slopes = new Float64Array(inputs.length);
		this.gradient(read(inputs), slopes);
		return { inputs, slopes };
	}

	private carried(program: ListProgram): Carried {
		const { inputs, outcome } = this;
		const count = (outcome.state === 'value' && outcome.list?.length) || 1;
		const carry: Carried['carry'] = (shares, width) =>
			program(new Inputs(figuresOf(inputs, shares), width)).shares;
		return { inputs, count, carry };
	}

	private figure(): number {
		// Minus zero is zero: nothing told may hang on the sign of nothing.
		return this.program!(read(this.inputs)) + 0;
	}

	private evaluated(scope: Scope): FormulaOutcome {
		if (this.blank) return { state: 'blank' };
		if (!this.parsed) return { state: 'fault', faults: [this.fault!] };
		const { expr, unitNames } = this.parsed;
		if (unitNames.some(({ name }) => scope.defines(name))) return this.objections(scope);
		let missing = false;
		for (let i = 0; i < this.names.length; i += 1) {
			const supply = scope.supply(this.names[i]!);
			if (typeof supply === 'string') return this.objections(scope);
			missing ||= !supply.manner;
			this.inputs[i] = supply;
		}
		if (missing) return this.waits();
		try {
			const type = this.typed(expr);
			const shown = { type, unit: this.unit, digits: this.digits };
			if (!this.lists) {
				this.program ??= compile(expr, this.names);
				return { state: 'value', si: this.figure(), list: null, ...shown };
			}
			const { values } = this.lists(new Inputs(figuresOf(this.inputs, []), 0));
			const list = type.list ? Float64Array.from(values, (value) => value + 0) : null;
			return { state: 'value', si: list ? 0 : values[0]! + 0, list, ...shown };
		} catch (error) {
			return { state: 'fault', faults: [asFault(error, this.field)] };
		}
	}

	private waits(): FormulaOutcome {
		const lacking = (_: unknown, i: number) => !this.inputs[i]!.manner;
		const roots = this.inputs.filter(lacking).flatMap(({ roots }) => roots);
		return { state: 'waits', for: this.names.filter(lacking), rootIds: [...new Set(roots)] };
	}

	/** The dimension and the way of showing, found anew only when those of something named have changed. */
	private typed(expr: Expr): ValueType {
		const known = (input: Slot, i: number) => {
			const manner = this.inferredFor[i];
			return manner !== undefined && sameManner(input.manner!, manner);
		};
		if (!this.type || !this.inputs.every(known)) {
			this.inferredFor = this.inputs.map(({ manner }) => manner!);
			this.type = this.inferred(expr);
			if (!(this.type instanceof Refusal)) {
				const isList = (name: string) => this.manner(name).type.list;
				this.lists = hasList(expr, isList) ? compileLists(expr, this.names, isList) : null;
				this.findManner(expr, this.type);
			}
		}
		if (this.type instanceof Refusal) throw this.type;
		return this.type;
	}

	private inferred(expr: Expr): ValueType | Refusal {
		try {
			const type = inferType(expr, (name) => this.manner(name).type);
			return type.list && !this.takesLists ? notSingle(expr) : type;
		} catch (error) {
			if (error instanceof Refusal) return error;
			throw error;
		}
	}

	private manner(name: string): Manner {
		return this.inferredFor[this.names.indexOf(name)]!;
	}

	/** The unit of the first thing named that has the dimension of the whole; digits where it is the whole. */
	private findManner(expr: Expr, type: ValueType): void {
		const own = (leaf: Expr) => {
			if (leaf.kind === 'number') return { unit: null, digits: significant(String(leaf.value)) };
			if (leaf.kind === 'literal') return { unit: leaf.unit.text, digits: leaf.digits };
			return leaf.kind === 'name' ? this.manner(leaf.name) : null;
		};
		const alike = (leaf: Expr) => {
			if (leaf.kind === 'literal') return equal(leaf.unit.dimension, type.dimension);
			return leaf.kind === 'name' && equal(this.manner(leaf.name).type.dimension, type.dimension);
		};
		const whole = own(expr);
		const first = isPure(type.dimension) ? undefined : [...leaves(expr)].find(alike);
		this.digits = whole?.digits ?? null;
		this.unit = whole?.unit ?? (first && own(first)?.unit) ?? null;
	}

	/** What is wrong with names, all of it at once. */
	private objections(scope: Scope): FormulaOutcome {
		const { expr, unitNames } = this.parsed!;
		const ambiguous = unitNames
			.filter(({ name }) => scope.defines(name))
			.map(({ name, from, to }) => ambiguousName(name, { from, to }));
		const unknown = this.names.flatMap((name) => {
			const supply = scope.supply(name);
			if (supply === 'unknown') return [unknownName(name, expr, scope)];
			return supply === 'model' ? [modelName(name, expr, scope)] : [];
		});
		const faults = [...ambiguous, ...unknown].map((refusal) => refusal.in(this.field));
		return { state: 'fault', faults };
	}
}

/** The figures of one formula at a time, in one place for all. */
let figures = new Float64Array(16);

function read(inputs: readonly Slot[]): Float64Array {
	if (inputs.length > figures.length) figures = new Float64Array(2 * inputs.length);
	for (let i = 0; i < inputs.length; i += 1) figures[i] = inputs[i]!.si;
	return figures;
}

const figuresOf = (inputs: readonly Slot[], shares: readonly (Float64Array | null)[]): Figures[] =>
	inputs.map(({ si, list }, i) => ({ values: list ?? [si], shares: shares[i] ?? null }));

function asFault(error: unknown, field: string): Fault {
	if (error instanceof Refusal) return error.in(field);
	throw error;
}
