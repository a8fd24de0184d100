/** Between the rows of a table that is two lists: one ascending or descending throughout, one to read from. */
import { told } from './compile';
import { Refusal } from './faults';
import { passOn, type Figures } from './figures';
import { functionNamed } from './functions';
import { atValue, blank, uneven, type Part } from './list-parts';
import { asText } from './print';
import { SLOPES } from './slopes';
import { placeOf, type Expr } from './tree';

type Call = Expr & { kind: 'call' };

/** Linear between rows; beyond the first and the last it has no value. */
export function interpolated(expr: Call, [x, xs, ys]: readonly Part[]): Part {
	const { evaluate } = functionNamed(expr.name);
	return {
		list: x!.list,
		run(inputs) {
			const [at, from, to] = [x!.run(inputs), xs!.run(inputs), ys!.run(inputs)];
			const direction = directionOf(expr, from, to);
			const found = blank(inputs, [at, from, to], at.values.length);
			atValue(x!.list, at.values.length, (i) => {
				const row = rowBelow(from.values, at.values[i]!, direction);
				if (row === null) throw outside(expr);
				const places = [
					{ figures: at, at: i },
					{ figures: from, at: row },
					{ figures: from, at: row + 1 },
					{ figures: to, at: row },
					{ figures: to, at: row + 1 }
				];
				const args = places.map(({ figures, at }) => figures.values[at]!);
				const value = told(evaluate(...args), expr);
				found.values[i] = value;
				if (found.shares) passOn(found, i, inputs.width, places, SLOPES.interpolate(args, value));
			});
			return found;
		}
	};
}

/** 1 for ascending values, −1 for descending ones. */
function directionOf({ args }: Call, { values: xs }: Figures, { values: ys }: Figures): 1 | -1 {
	const [, column, other] = args as [Expr, Expr, Expr];
	if (xs.length !== ys.length) throw uneven(column, xs.length, other, ys.length);
	if (xs.length < 2) {
		throw new Refusal('domain', `${asText(column)} has one value: there is nothing between.`, {
			place: placeOf(column)
		});
	}
	const direction = xs[1]! > xs[0]! ? 1 : -1;
	for (let i = 1; i < xs.length; i += 1) {
		if (direction * (xs[i]! - xs[i - 1]!) > 0) continue;
		throw new Refusal(
			'domain',
			`${asText(column)} must ascend or descend throughout; value ${i + 1} does not go on from value ${i}.`,
			{ place: placeOf(column) }
		);
	}
	return direction;
}

/** The row at or below x that has one after it; null where x lies outside of the table. */
function rowBelow(xs: ArrayLike<number>, x: number, direction: 1 | -1): number | null {
	const last = xs.length - 1;
	if (direction * (x - xs[0]!) < 0 || direction * (x - xs[last]!) > 0) return null;
	let [low, high] = [0, last];
	while (high - low > 1) {
		const middle = (low + high) >> 1;
		if (direction * (x - xs[middle]!) >= 0) low = middle;
		else high = middle;
	}
	return low;
}

function outside({ args }: Call): Refusal {
	const [x, column] = args as [Expr, Expr, Expr];
	return new Refusal(
		'domain',
		`${asText(x)} lies outside of ${asText(column)}: beyond a table there is nothing to go by.`,
		{ place: placeOf(x) ?? placeOf(column) }
	);
}
