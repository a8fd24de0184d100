/** The change that fills half of the bar: the least round one that holds the greatest change, at most all. */
const ROUND = [0.001, 0.0025, 0.005, 0.01, 0.025, 0.05, 0.1, 0.25, 0.5, 1];

export function barScale(changes: readonly (number | null)[]): number {
	const greatest = Math.max(0, ...changes.map((change) => Math.abs(change ?? 0)));
	return ROUND.find((scale) => scale >= greatest) ?? 1;
}
