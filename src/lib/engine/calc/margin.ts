/**
 * The margin of a check. For ≤ and ≥ with both sides positive: the larger allowed over the actual, less
 * one, so that for a stress it is the margin of safety. Within a tolerance: the share of it not used up,
 * 1 − |left − right|/tolerance, which stays finite where the two are equal. Otherwise the difference.
 */
export type Margin = {
	kind: 'ratio' | 'difference';
	/** A ratio, or a difference in SI. */
	size: number;
	/** As a pure number: a difference is taken as a share of the larger side, unless it is one already. */
	relative: number;
	/** What is missing to the required margin, in SI; negative where it is met. */
	shortBy: number;
};

export type Sides = {
	relation: 'le' | 'ge' | 'within';
	/** All in SI; the required margin is a ratio or a difference, as the margin is. */
	left: number;
	right: number;
	tolerance: number;
	required: number;
	pure: boolean;
};

export function marginKind({ relation, left, right, tolerance }: Sides): Margin['kind'] {
	if (relation === 'within') return tolerance > 0 ? 'ratio' : 'difference';
	return left > 0 && right > 0 ? 'ratio' : 'difference';
}

export function marginOf(sides: Sides): Margin {
	const { relation, left, right, tolerance, required } = sides;
	const away = Math.abs(left - right);
	if (marginKind(sides) === 'difference') {
		const size = { le: right - left, ge: left - right, within: -away }[relation];
		const larger = Math.max(Math.abs(left), Math.abs(right));
		const relative = sides.pure ? size : larger === 0 ? 0 : size / larger;
		return { kind: 'difference', size, relative, shortBy: required - size };
	}
	const [size, shortBy] = {
		le: [right / left - 1, left - right / (1 + required)],
		ge: [left / right - 1, right * (1 + required) - left],
		within: [1 - away / tolerance, away - tolerance * (1 - required)]
	}[relation] as [number, number];
	return { kind: 'ratio', size: told(size), relative: told(size), shortBy: told(shortBy) };
}

/**
 * Slopes of the margin by left, right and tolerance. Within a tolerance it has its corner where both sides
 * are equal; there its size to either side is taken.
 */
export function marginSlopes(sides: Sides): [left: number, right: number, tolerance: number] {
	const { relation, left, right, tolerance } = sides;
	const ratio = marginKind(sides) === 'ratio';
	if (relation === 'le') return ratio ? [-right / left / left, 1 / left, 0] : [-1, 1, 0];
	if (relation === 'ge') return ratio ? [1 / right, -left / right / right, 0] : [1, -1, 0];
	const away = left < right ? -1 : 1;
	if (!ratio) return [-away, away, 0];
	return [-away / tolerance, away / tolerance, Math.abs(left - right) / tolerance / tolerance];
}

/** Equal to twelve digits is equal: exp and log differ in the last one between platforms. */
const TWELVE_DIGITS = 1e-12;

/** Below the required margin a check fails; above it, it is thin below the thin limit. */
export function verdictOf(margin: Margin, sides: Sides, thinLimit: number) {
	const { left, right, required } = sides;
	const scale = margin.kind === 'ratio' ? 1 : Math.max(Math.abs(left), Math.abs(right));
	if (margin.size < required - TWELVE_DIGITS * scale) return 'fails';
	return margin.relative < thinLimit - TWELVE_DIGITS ? 'thin' : 'holds';
}

/** A ratio of the largest to the smallest figure leaves the range of numbers. */
const told = (value: number) => Math.max(-1e300, Math.min(1e300, value));
