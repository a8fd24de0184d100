/** What the methods about a spinning tether ask for and answer alike. */
import { quantity } from '../methods/parameter';
import {
	ACCELERATION,
	DENSITY,
	LENGTH,
	MASS,
	PURE,
	TIME,
	VELOCITY,
	over
} from '../quantities/dimension';

export const armInputs = {
	density: quantity({
		label: 'density',
		symbol: 'ρ',
		dimension: DENSITY,
		unit: 'kg/m^3',
		range: { above: 0 }
	}),
	tipSpeed: quantity({
		label: 'tip speed',
		symbol: 'V',
		dimension: VELOCITY,
		unit: 'km/s',
		range: { above: 0 }
	}),
	tipMass: quantity({
		label: 'mass at the tip',
		symbol: 'm',
		dimension: MASS,
		unit: 't',
		range: { above: 0 }
	})
} as const;

export const spinOutputs = {
	rate: quantity({
		label: 'rate of spin, V/L',
		symbol: 'Ω',
		dimension: over(PURE, TIME),
		unit: 'rad/s'
	}),
	period: quantity({ label: 'period of the spin', dimension: TIME, unit: 'min' }),
	tipAcceleration: quantity({
		label: 'acceleration at the tip, V²/L',
		symbol: 'a',
		dimension: ACCELERATION,
		unit: 'm/s^2'
	})
} as const;

/** @param length from the centre to the tip, m */
export const spinOf = (tipSpeed: number, length: number) => ({
	rate: tipSpeed / length,
	period: (2 * Math.PI * length) / tipSpeed,
	tipAcceleration: tipSpeed ** 2 / length
});

export const armLength = quantity({
	label: 'length of an arm, from the centre to the tip',
	symbol: 'L',
	dimension: LENGTH,
	unit: 'km',
	range: { above: 0 }
});
