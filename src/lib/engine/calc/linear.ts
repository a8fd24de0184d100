/** How a figure follows from others to first order: a change of it is the sum of slope times change over its inputs. */
import type { Slot } from './slot';

export type Linear = { inputs: readonly Slot[]; slopes: ArrayLike<number> };

/**
 * How figures follow from others where lists are among them: `carry` takes the shares of each input, a row
 * of `width` for each of its values (null where it is exact), and gives those of the `count` values found.
 */
export type Carried = {
	inputs: readonly Slot[];
	count: number;
	carry: (shares: readonly (Float64Array | null)[], width: number) => Float64Array | null;
};

export type Derived = Linear | Carried;

/** What a change of several figures does to one that follows from them with these slopes. */
export function joined(parts: readonly Derived[], slopes: readonly number[]): Derived {
	const inputs = parts.flatMap(({ inputs }) => inputs);
	if (parts.every((part) => 'slopes' in part))
		return {
			inputs,
			slopes: parts.flatMap((part, i) => Array.from(part.slopes, (slope) => slopes[i]! * slope))
		};
	return {
		inputs,
		count: 1,
		carry(shares, width) {
			const row = new Float64Array(width);
			let at = 0;
			parts.forEach((part, i) => {
				const own = shares.slice(at, (at += part.inputs.length));
				carriedBy(part, own, width)?.forEach((share, k) => {
					if (share !== 0) row[k]! += slopes[i]! * share;
				});
			});
			return row;
		}
	};
}

/** The shares of what follows from inputs with these shares. */
function carriedBy(part: Derived, shares: readonly (Float64Array | null)[], width: number) {
	if ('carry' in part) return part.carry(shares, width);
	const row = new Float64Array(width);
	shares.forEach((own, i) => {
		own?.forEach((share, k) => {
			if (share !== 0 && part.slopes[i] !== 0) row[k]! += part.slopes[i]! * share;
		});
	});
	return row;
}
