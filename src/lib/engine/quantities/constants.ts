/** Constants that expressions may name. */
import { BODIES, type BodyName } from '../line/bodies';
import { ACCELERATION, LENGTH, PURE, TIME, dimension, over, type Dimension } from './dimension';
import { UNIVERSAL } from './universal';

export type Constant = {
	/** In coherent SI units. */
	value: number;
	dimension: Dimension;
	unit: string;
	description: string;
	tex: string;
};

const GRAVITATIONAL = dimension(0, 3, -2);

const general: Record<string, Constant> = {
	pi: { value: Math.PI, dimension: PURE, unit: '', description: 'Circle constant', tex: '\\pi' },
	e: { value: Math.E, dimension: PURE, unit: '', description: 'Base of ln', tex: '\\mathrm{e}' },
	g_0: {
		value: UNIVERSAL.standardGravity.value,
		dimension: ACCELERATION,
		unit: 'm/s^2',
		description: 'Standard acceleration of free fall, exact (3rd CGPM, 1901)',
		tex: 'g_0'
	},
	G: {
		value: UNIVERSAL.gravitation.value,
		dimension: dimension(-1, 3, -2),
		unit: 'm^3/(kg s^2)',
		description: 'Constant of gravitation (CODATA 2018)',
		tex: 'G'
	},
	'sun.GM': {
		value: UNIVERSAL.sunGm.value,
		dimension: GRAVITATIONAL,
		unit: 'm^3/s^2',
		description: 'Sun, gravitational parameter',
		tex: 'GM_\\mathrm{sun}'
	}
};

function ofBody(name: BodyName): [string, Constant][] {
	const { gm, radius, rate, j2, label } = BODIES[name];
	const index = (symbol: string) => `${symbol}_\\mathrm{${name}}`;
	return [
		[
			`${name}.GM`,
			{
				value: gm.value,
				dimension: GRAVITATIONAL,
				unit: 'm^3/s^2',
				description: `${label}, gravitational parameter (${gm.source})`,
				tex: index('GM')
			}
		],
		[
			`${name}.radius`,
			{
				value: radius.value,
				dimension: LENGTH,
				unit: 'km',
				description: `${label}, radius (${radius.source})`,
				tex: index('R')
			}
		],
		[
			`${name}.rate`,
			{
				value: rate.value,
				dimension: over(PURE, TIME),
				unit: 'rad/s',
				description: `${label}, rate of rotation (${rate.source})`,
				tex: index('\\omega')
			}
		],
		...(j2
			? ([
					[
						`${name}.J2`,
						{
							value: j2.value,
							dimension: PURE,
							unit: '',
							description: `${label}, J2 (${j2.source})`,
							tex: `J_{2,\\mathrm{${name}}}`
						}
					]
				] as [string, Constant][])
			: [])
	];
}

export const CONSTANTS: ReadonlyMap<string, Constant> = new Map([
	...Object.entries(general),
	['π', general.pi!] as [string, Constant],
	...(Object.keys(BODIES) as BodyName[]).flatMap(ofBody)
]);
