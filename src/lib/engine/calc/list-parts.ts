/** The parts of an expression in which lists stand, each run on figures. */
import { outOfDomain, told, type Program } from './compile';
import { Refusal } from './faults';
import { passOn, type Figures, type Inputs } from './figures';
import type { Gather } from './gather';
import { asText } from './print';
import { SLOPES } from './slopes';
import { placeOf, type Expr } from './tree';

export type Part = { list: boolean; run: (inputs: Inputs) => Figures };
export type SlopesOf = (args: readonly number[], value: number) => readonly number[];
type Call = Expr & { kind: 'call' };

export const fixed = (value: number): Part => {
	const figures: Figures = { values: [value], shares: null };
	return { list: false, run: () => figures };
};

/** Value by value; what is one value goes with each of a list. */
export function each(
	parts: readonly Part[],
	exprs: readonly Expr[],
	run: Program,
	slopesOf: SlopesOf
): Part {
	const list = parts.some((part) => part.list);
	return {
		list,
		run(inputs) {
			const from = parts.map((part) => part.run(inputs));
			const count = commonCount(parts, from, exprs);
			const found = blank(inputs, from, count);
			const args: number[] = from.map(() => 0);
			const at = (k: number, i: number) => (parts[k]!.list ? i : 0);
			atValue(list, count, (i) => {
				for (let k = 0; k < args.length; k += 1) args[k] = from[k]!.values[at(k, i)]!;
				const value = run(args);
				found.values[i] = value;
				if (!found.shares) return;
				const places = from.map((figures, k) => ({ figures, at: at(k, i) }));
				passOn(found, i, inputs.width, places, slopesOf(args, value));
			});
			return found;
		}
	};
}

/** The values of all parts in one list. */
export function listed(parts: readonly Part[]): Part {
	return { list: true, run: (inputs) => together(inputs, parts) };
}

/** One value from those of all parts. */
export function gathered(parts: readonly Part[], expr: Call, gathers: Gather, words: string): Part {
	return {
		list: false,
		run(inputs) {
			const all = together(inputs, parts);
			const value = gathers(all.values);
			if (Number.isNaN(value)) throw outOfDomain(expr, words);
			const found = blank(inputs, [all], 1);
			found.values[0] = told(value, expr);
			if (found.shares) {
				const args = Array.from(all.values);
				const places = args.map((_, at) => ({ figures: all, at }));
				passOn(found, 0, inputs.width, places, SLOPES[expr.name](args, value));
			}
			return found;
		}
	};
}

/** One value of a list, counted from 1. */
export function picked({ of, index }: Expr & { kind: 'pick' }, list: Part, number: Part): Part {
	return {
		list: false,
		run(inputs) {
			const { values, shares } = list.run(inputs);
			const place = number.run(inputs).values[0]!;
			const [count, at] = [values.length, place - 1];
			if (!Number.isInteger(place) || place < 1 || place > count) {
				const held = count === 1 ? '1 value' : `${count} values`;
				throw new Refusal('domain', `${asText(of)} has ${held}: there is no value ${place}.`, {
					remedy: `The first is ${asText(of)}[1].`,
					place: placeOf(index) ?? placeOf(of)
				});
			}
			const { width } = inputs;
			return {
				values: [values[at]!],
				shares: shares && shares.slice(at * width, (at + 1) * width)
			};
		}
	};
}

/** Room for so many values, with shares where any of what they come from has some. */
export function blank(inputs: Inputs, from: readonly Figures[], count: number) {
	inputs.spend(count);
	const uncertain = inputs.width > 0 && from.some(({ shares }) => shares);
	return {
		values: new Float64Array(count),
		shares: uncertain ? new Float64Array(count * inputs.width) : null
	};
}

function together(inputs: Inputs, parts: readonly Part[]): Figures {
	const from = parts.map((part) => part.run(inputs));
	if (from.length === 1) return from[0]!;
	const count = from.reduce((sum, { values }) => sum + values.length, 0);
	const found = blank(inputs, from, count);
	let at = 0;
	for (const { values, shares } of from) {
		found.values.set(values, at);
		if (shares) found.shares!.set(shares, at * inputs.width);
		at += values.length;
	}
	return found;
}

/** How many values the lists among the parts have; 1 where there is no list. */
function commonCount(
	parts: readonly Part[],
	figures: readonly Figures[],
	args: readonly Expr[]
): number {
	const lists = figures.flatMap(({ values }, k) =>
		parts[k]!.list ? [{ count: values.length, k }] : []
	);
	const [first] = lists;
	const other = lists.find(({ count }) => count !== first!.count);
	if (!first || !other) return first?.count ?? 1;
	throw uneven(args[first.k]!, first.count, args[other.k]!, other.count);
}

export const uneven = (a: Expr, countOfA: number, b: Expr, countOfB: number) =>
	new Refusal(
		'domain',
		`${asText(a)} has ${countOfA} values and ${asText(b)} ${countOfB}: they do not go together value by value.`,
		{ place: placeOf(b) ?? placeOf(a) }
	);

/** Does something for each value, and says at which of a list it did not work. */
export function atValue(list: boolean, count: number, work: (i: number) => void): void {
	let i = 0;
	try {
		for (; i < count; i += 1) work(i);
	} catch (error) {
		if (!list || !(error instanceof Refusal)) throw error;
		throw new Refusal(error.code, `At value ${i + 1}: ${error.message}`, error.more);
	}
}
