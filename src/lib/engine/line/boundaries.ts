/** Where the sections of a stepped line meet. */
import type { Field } from './field';
import { radiusAtDepth } from './level';

/** Sections of equal height, r₀ … r_N. */
export const equalHeights = (field: Field, top: number, count: number): number[] =>
	Array.from({ length: count + 1 }, (_, i) =>
		i === count ? top : field.base + ((top - field.base) * i) / count
	);

/**
 * Sections over which U changes by equal amounts, its rise to r_s and its fall beyond counted together: short where the field is
 * strong. All then gain the same factor of area, but for the one that spans r_s.
 */
export function equalRises(field: Field, top: number, count: number): number[] {
	const { base, depth } = field;
	const [below, above] = [depth(base), depth(top)];
	return Array.from({ length: count + 1 }, (_, i) => {
		if (i === 0) return base;
		if (i === count) return top;
		const risen = ((below + above) * i) / count;
		return risen < below
			? radiusAtDepth(field, below - risen, base)
			: radiusAtDepth(field, risen - below, top);
	});
}
