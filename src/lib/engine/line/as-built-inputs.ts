/** What an as-built analysis may be asked besides the line itself. */
import { group, quantity, type ValuesOf } from '../methods/parameter';
import { MASS, PRESSURE, PURE, TEMPERATURE, over } from '../quantities/dimension';
import type { Elasticity } from './elongation';

export const requiredLift = group({
	label: 'lift that the anchor must hold in reserve',
	optional: true,
	fields: {
		mass: quantity({
			label: 'lift',
			symbol: 'm_lift',
			dimension: MASS,
			unit: 't',
			range: { above: 0 }
		}),
		reserve: quantity({
			label: 'required reserve, as a fraction of the lift’s weight at the anchor',
			dimension: PURE,
			unit: '',
			range: { least: 0 },
			help: 'The anchor tension with all masses in place must reach this share of the lift’s weight.'
		})
	}
});

export const elasticity = group({
	label: 'elasticity, for strain and stretch',
	optional: true,
	fields: {
		modulus: quantity({
			label: 'modulus of elasticity',
			symbol: 'E',
			dimension: PRESSURE,
			unit: 'GPa',
			range: { above: 0 }
		}),
		expansion: quantity({
			label: 'coefficient of thermal expansion',
			symbol: 'α',
			dimension: over(PURE, TEMPERATURE),
			unit: '1/K',
			default: 0
		}),
		temperatureRise: quantity({
			label: 'temperature above that of manufacture',
			symbol: 'ΔT',
			dimension: TEMPERATURE,
			unit: 'K',
			default: 0,
			help: 'A difference of temperatures.'
		})
	}
});

export const thermal = ({
	modulus,
	expansion,
	temperatureRise
}: ValuesOf<(typeof elasticity)['fields']>): Elasticity => ({
	modulus,
	thermalStrain: expansion * temperatureRise
});
