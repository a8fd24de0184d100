/** One typed expression: parsed once, its dimension checked when what it names changes, then run on floats. */
import { CONSTANTS } from '../quantities/constants';
import { significant } from '../quantities/number';
import { UNITS } from '../quantities/unit-table';
import { equal, isPure } from '../quantities/dimension';
import { compile, type Program } from './compile';
import { Refusal } from './faults';
import { inferValue, type ValueType } from './infer';
import { parse, type Parsed } from './parse';
import { asTex } from './print';
import type { Fault } from './results';
import type { Scope, Supply } from './scope';
import { children, type Expr } from './tree';

type ValueSupply = Supply & { state: 'value' };

export type FormulaOutcome =
	| { state: 'value'; si: number; type: ValueType; unit: string | null; digits: number | null }
	| { state: 'blank' }
	| { state: 'waits'; for: string[]; rootIds: string[] }
	| { state: 'fault'; faults: Fault[] };

export class Formula {
	readonly blank: boolean;
	readonly tex: string;
	/** Every name that others may define: symbols, and units that must not be symbols. */
	readonly mentions: readonly string[];
	readonly names: readonly string[];
	private parsed: Parsed | null = null;
	private fault: Fault | null = null;
	private program: Program | null = null;
	private inputTypes: ValueType[] | null = null;
	private type: ValueType | Refusal | null = null;

	constructor(
		text: string,
		private field: string
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

	evaluate(scope: Scope): FormulaOutcome {
		if (this.blank) return { state: 'blank' };
		if (!this.parsed) return { state: 'fault', faults: [this.fault!] };
		const faults = this.nameFaults(this.parsed, scope);
		if (faults.length > 0) return { state: 'fault', faults };

		const supplies = this.names.map((name) => scope.supply(name) as Supply);
		const missing = this.names.filter((_, i) => supplies[i]!.state === 'missing');
		if (missing.length > 0) {
			const roots = supplies.flatMap((s) => (s.state === 'missing' ? s.roots : []));
			return { state: 'waits', for: missing, rootIds: [...new Set(roots)] };
		}
		const inputs = supplies as ValueSupply[];
		try {
			const type = this.typed(this.parsed.expr, inputs);
			this.program ??= compile(this.parsed.expr, this.names);
			const si = this.program(inputs.map((input) => input.si));
			return { state: 'value', si, type, ...this.manner(this.parsed.expr, type, inputs) };
		} catch (error) {
			return { state: 'fault', faults: [asFault(error, this.field)] };
		}
	}

	/** The dimension, inferred anew only when that of something named has changed. */
	private typed(expr: Expr, inputs: ValueSupply[]): ValueType {
		const types = inputs.map((input) => input.type);
		if (!this.inputTypes?.every((type, i) => sameType(type, types[i]!))) {
			this.inputTypes = types;
			try {
				this.type = inferValue(expr, (name) => types[this.names.indexOf(name)]!);
			} catch (error) {
				if (!(error instanceof Refusal)) throw error;
				this.type = error;
			}
		}
		if (this.type instanceof Refusal) throw this.type;
		return this.type!;
	}

	/** The unit of the first thing named that has the dimension of the whole; digits where it is the whole. */
	private manner(expr: Expr, type: ValueType, inputs: ValueSupply[]) {
		const own = (leaf: Expr) =>
			leaf.kind === 'name' ? inputs[this.names.indexOf(leaf.name)]! : null;
		const whole =
			expr.kind === 'number'
				? significant(String(expr.value))
				: expr.kind === 'literal'
					? expr.digits
					: (own(expr)?.digits ?? null);
		if (isPure(type.dimension)) return { unit: own(expr)?.unit ?? null, digits: whole };
		for (const leaf of leaves(expr)) {
			if (leaf.kind === 'literal' && equal(leaf.unit.dimension, type.dimension)) {
				return { unit: leaf.unit.text, digits: whole };
			}
			const input = own(leaf);
			if (input && equal(input.type.dimension, type.dimension)) {
				return { unit: input.unit, digits: whole };
			}
		}
		return { unit: null, digits: whole };
	}

	private nameFaults(parsed: Parsed, scope: Scope): Fault[] {
		const ambiguous = parsed.unitNames
			.filter(({ name }) => scope.defines(name))
			.map(({ name, from, to }) =>
				new Refusal('ambiguous-name', `“${name}” is a unit and also a quantity of this note.`, {
					remedy: `Write “*” before it to mean the quantity, or give the quantity another symbol.`,
					place: { from, to }
				}).in(this.field)
			);
		const unknown = this.names.flatMap((name) => {
			const supply = scope.supply(name);
			if (supply === 'unknown') return [unknownName(name, parsed.expr, scope).in(this.field)];
			if (supply === 'model') return [modelName(name, parsed.expr, scope).in(this.field)];
			return [];
		});
		return [...ambiguous, ...unknown];
	}
}

const sameType = (a: ValueType, b: ValueType) =>
	a === b || (a.scale === b.scale && equal(a.dimension, b.dimension));

function* leaves(expr: Expr): Generator<Expr> {
	const parts = children(expr);
	if (parts.length === 0) yield expr;
	for (const part of parts) yield* leaves(part);
}

function placeOfName(expr: Expr, name: string) {
	for (const leaf of leaves(expr)) {
		if (leaf.kind === 'name' && leaf.name === name) return leaf.place;
	}
	return null;
}

function unknownName(name: string, expr: Expr, scope: Scope): Refusal {
	const near = scope.near(name);
	const place = placeOfName(expr, name);
	const [model] = name.split('.');
	if (name !== model && scope.supply(model!) === 'model') {
		return new Refusal('unknown-symbol', `${model} gives no “${name.slice(model!.length + 1)}”.`, {
			place,
			near
		});
	}
	if (name !== model && [...CONSTANTS.keys()].some((known) => known.startsWith(`${model}.`))) {
		return new Refusal('unknown-symbol', `There is no constant ${name}.`, { place, near });
	}
	if (name === 'to' || name === 'in') {
		return new Refusal('not-allowed', `“${name}” converts nothing here.`, {
			remedy: 'Choose the unit to show the value in beside the expression.',
			place
		});
	}
	const remedy = UNITS.has(name)
		? `If the unit is meant, write it directly after a number: 1 ${name}.`
		: '';
	return new Refusal('unknown-symbol', `There is no quantity ${name} in this note.`, {
		remedy,
		place,
		near
	});
}

const modelName = (name: string, expr: Expr, scope: Scope) =>
	new Refusal('unknown-symbol', `${name} is a line model, not a quantity.`, {
		remedy: `Name one of the quantities that it gives, e.g. ${name}.taper.`,
		place: placeOfName(expr, name),
		near: scope.near(`${name}.`)
	});

function asFault(error: unknown, field: string): Fault {
	if (error instanceof Refusal) return error.in(field);
	throw error;
}
