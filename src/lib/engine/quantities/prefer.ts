/** The unit to show where nobody chose one: coherent, with the prefix that leaves 1 to 999 before the point. */
import {
	AREA,
	DENSITY,
	ENERGY,
	FORCE,
	LENGTH,
	MASS,
	POWER,
	PRESSURE,
	SPECIFIC_STRENGTH,
	TIME,
	VELOCITY,
	dimension,
	equal,
	fraction,
	isPure,
	type Dimension
} from './dimension';

/** Rising steps: the last one that the size reaches is used. */
type Step = [from: number, unit: string];

const prefixed = (unit: string): Step[] => [
	[0, unit],
	[1e3, `k${unit}`],
	[1e6, `M${unit}`],
	[1e9, `G${unit}`],
	[1e12, `T${unit}`]
];

const STEPS: [Dimension, Step[]][] = [
	[
		MASS,
		[
			[0, 'g'],
			[1, 'kg'],
			[1e3, 't']
		]
	],
	[
		LENGTH,
		[
			[0, 'mm'],
			[1, 'm'],
			[1e3, 'km']
		]
	],
	[
		AREA,
		[
			[0, 'mm^2'],
			[1e-2, 'm^2']
		]
	],
	[
		TIME,
		[
			[0, 's'],
			[3600, 'h'],
			[2 * 86400, 'd']
		]
	],
	[FORCE, prefixed('N')],
	[PRESSURE, prefixed('Pa')],
	[ENERGY, prefixed('J')],
	[POWER, prefixed('W')],
	[DENSITY, [[0, 'kg/m^3']]],
	[VELOCITY, [[0, 'm/s']]],
	[
		SPECIFIC_STRENGTH,
		[
			[0, 'J/kg'],
			[1e3, 'kJ/kg'],
			[1e6, 'MJ/kg']
		]
	],
	[dimension(0, 0, 0, 1), [[0, 'K']]]
];

/** The unit, and the sizes in SI for which it stays that one: from ≤ size < below. */
export function preferredUnit(size: number, d: Dimension): Preferred {
	const steps = isPure(d) ? undefined : STEPS.find(([known]) => equal(known, d))?.[1];
	if (!steps) return { text: isPure(d) ? '' : coherentUnit(d), from: 0, below: Infinity };
	const at = steps.filter(([from]) => size >= from).length - 1;
	const [from, text] = steps[at]!;
	return { text, from, below: steps[at + 1]?.[0] ?? Infinity };
}

export type Preferred = { text: string; from: number; below: number };

const BASE = ['kg', 'm', 's', 'K', 'A', 'mol', 'cd'];

function coherentUnit(d: Dimension): string {
	const power = (e: number) =>
		e === 1 ? '' : `^${fraction(e).includes('/') ? `(${fraction(e)})` : fraction(e)}`;
	const above = d.flatMap((e, i) => (e > 0 ? [BASE[i]! + power(e)] : []));
	const below = d.flatMap((e, i) => (e < 0 ? [BASE[i]! + power(-e)] : []));
	if (below.length === 0) return above.join(' ');
	const divisor = below.length === 1 ? below[0]! : `(${below.join(' ')})`;
	return `${above.join(' ') || '1'}/${divisor}`;
}
