/** Values over a range, ends included. */
import { refuseInput } from '../methods/refused';

export type Spacing = {
	from: number;
	to: number;
	count: number;
	spacing: 'linear' | 'logarithmic';
};

/** The ends are met exactly. @throws Refused, about the place `at`, where a range cannot be spaced so. */
export function spaced({ from, to, count, spacing }: Spacing, at: string): number[] {
	if (count === 1 && from !== to)
		refuseInput(
			`${at}.count`,
			'One value cannot have two ends: make both ends the same, or ask for two.'
		);
	if (spacing === 'logarithmic' && !(from * Math.sign(to) > 0))
		refuseInput(at, 'Equal ratios need both ends on the same side of zero.');
	const between = (share: number) =>
		spacing === 'linear'
			? from * (1 - share) + to * share
			: Math.sign(from) * Math.abs(from) ** (1 - share) * Math.abs(to) ** share;
	return Array.from({ length: count }, (_, i) =>
		i === 0 ? from : i === count - 1 ? to : between(i / (count - 1))
	);
}
