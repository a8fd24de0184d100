/** Plain linear scales and round ticks for charts drawn as SVG. */
export type Scale = (value: number) => number;

export function linear([d0, d1]: [number, number], [r0, r1]: [number, number]): Scale {
	const span = d1 - d0 || 1;
	return (value) => r0 + ((value - d0) / span) * (r1 - r0);
}

/** Round steps (1, 2 or 5 times a power of ten) from zero or the lower end up to `max`. */
export function ticks(min: number, max: number, about: number): number[] {
	const span = max - min;
	if (!(span > 0) || !Number.isFinite(span)) return [min];
	const raw = span / about;
	const power = 10 ** Math.floor(Math.log10(raw));
	const step = ([1, 2, 5, 10].find((factor) => factor * power >= raw * (1 - 1e-9)) ?? 10) * power;
	const first = Math.ceil(min / step - 1e-9);
	const count = Math.floor(max / step + 1e-9) - first + 1;
	return Array.from({ length: count }, (_, index) => (first + index) * step);
}

/** The value at `at` in a table ordered by x, by straight lines between rows. */
export function interpolate(x: readonly number[], y: readonly number[], at: number): number {
	const upper = x.findIndex((value) => value >= at);
	if (upper === -1) return y.at(-1) ?? 0;
	if (upper === 0) return y[0] ?? 0;
	const [x0, x1] = [x[upper - 1]!, x[upper]!];
	const [y0, y1] = [y[upper - 1]!, y[upper]!];
	return x1 === x0 ? y1 : y0 + ((y1 - y0) * (at - x0)) / (x1 - x0);
}
