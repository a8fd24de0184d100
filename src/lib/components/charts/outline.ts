import type { Scale } from './scale';

/** A closed outline, symmetric about `centre`, whose half width follows `width` over `height`. */
export function outline(
	height: readonly number[],
	width: readonly number[],
	y: Scale,
	half: Scale,
	centre: number
): string {
	const point = (side: 1 | -1, index: number) =>
		`${round(centre + side * half(width[index]!))} ${round(y(height[index]!))}`;
	const up = height.map((_, index) => point(1, index));
	const down = height.map((_, index) => point(-1, index)).reverse();
	return height.length === 0 ? '' : `M${[...up, ...down].join('L')}Z`;
}

/** A line through points of `x` over `height`. */
export function trace(
	height: readonly number[],
	values: readonly number[],
	y: Scale,
	x: Scale
): string {
	return height
		.map((h, index) => `${index === 0 ? 'M' : 'L'}${round(x(values[index]!))} ${round(y(h))}`)
		.join('');
}

const round = (value: number) => Math.round(value * 100) / 100;
