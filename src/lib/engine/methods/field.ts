/** Field: what pulls on a line at given radii, and where it balances. */
import { BODIES, type BodyName } from '../line/bodies';
import { givenRadius, radiusOf } from '../line/parameters';
import { fieldOf, site } from '../line/site';
import { siteWarnings } from '../line/site-warnings';
import {
	ACCELERATION,
	PURE,
	SPECIFIC_STRENGTH,
	TIME,
	dimension,
	over
} from '../quantities/dimension';
import { distance } from '../quantities/format';
import type { Figure } from '../quantities/universal';
import { defineMethod } from './method';
import { group, list, quantity, text } from './parameter';
import { refuseInput } from './refused';

const stiffness = (label: string, symbol: string) =>
	quantity({ label, symbol, dimension: dimension(0, 0, -2), unit: '1/s^2' });
const energy = (label: string, symbol: string) =>
	quantity({ label, symbol, dimension: SPECIFIC_STRENGTH, unit: 'J/kg' });

export const field = defineMethod({
	name: 'field',
	title: 'Field along the line',
	summary:
		'Balance radius, and at given radii the inward acceleration, the gain of potential and the stiffness of the field along and across the line.',
	subject: 'line',
	inputs: {
		site,
		radii: list({
			label: 'radii to tell, from the body’s centre',
			fewest: 0,
			most: 5000,
			of: givenRadius('radius')
		})
	},
	outputs: {
		baseRadius: radiusOf('radius of the anchor', 'R'),
		balanceRadius: {
			...radiusOf('balance radius', 'r_s'),
			help: 'Where g is zero: the synchronous radius, or L1 or L2 on a line from a moon.'
		},
		rate: quantity({
			label: 'rate of rotation of the frame',
			symbol: 'ω',
			dimension: over(PURE, TIME),
			unit: 'rad/s'
		}),
		figures: list({
			label: 'figures of a known body, with standard uncertainty and source',
			fewest: 0,
			most: 4,
			of: text({ label: 'figure', longest: 200 }),
			help: 'In SI units; an uncertainty of 0 is a definition.'
		}),
		climb: energy('gain of potential from the anchor to the balance radius', 'U(r_s) − U(R)'),
		points: list({
			label: 'at the radii, in the order given',
			fewest: 0,
			most: 5000,
			of: group({
				label: 'radius',
				fields: {
					radius: radiusOf('radius', 'r'),
					g: quantity({
						label: 'inward acceleration',
						symbol: 'g',
						dimension: ACCELERATION,
						unit: 'm/s^2',
						help: 'Negative above the balance radius.'
					}),
					rise: energy('gain of potential from the anchor', 'U(r) − U(R)'),
					depth: energy('gain of potential from here to the balance radius', 'U(r_s) − U(r)'),
					along: stiffness('stiffness along the line, per mass', 'k_x'),
					inPlane: stiffness('stiffness across it, in the plane of rotation', 'k_y'),
					outOfPlane: stiffness('stiffness across it, out of the plane', 'k_z')
				}
			})
		})
	},
	sources: [
		'g = GM/r² − ω²r + (3/2) J2 GM R²/r⁴ on the equator',
		'circular restricted three-body problem for a line from a moon',
		'bodies: WGS 84 (NIMA TR 8350.2), JPL DE440, IAU WGCCRE'
	],
	validity:
		'Straight line from an anchor on the equator, in the co-rotating frame. A moon is tidally locked on a circular orbit about its primary; J2 does not apply there, and the rate follows from the distance.',
	leftOut: [
		'harmonics beyond J2',
		'other bodies; on one body its primary too',
		'eccentricity and inclination of a moon’s orbit'
	],
	refuses: ['a balance radius inside the body', 'a radius at the centre of the primary or beyond'],
	caution: '',
	run({ site, radii }) {
		const field = fieldOf(site);
		radii.forEach((r, i) => {
			if (r >= field.limit)
				refuseInput(
					`radii.${i}`,
					`The radius ${distance(r)} lies at the centre of the primary or beyond.`
				);
		});
		return {
			outputs: {
				baseRadius: field.base,
				balanceRadius: field.balance,
				rate: field.omega,
				figures: site.kind === 'body' ? figuresOf(site.body) : [],
				climb: field.depth(field.base),
				points: radii.map((r) => ({
					radius: r,
					g: field.g(r),
					rise: field.rise(field.base, r),
					depth: field.depth(r),
					along: field.along(r),
					inPlane: field.inPlane(r),
					outOfPlane: field.outOfPlane(r)
				}))
			},
			warnings: siteWarnings(site, field, Math.max(field.base, ...radii))
		};
	}
});

function figuresOf(name: BodyName): string[] {
	const { gm, radius, rate, j2 } = BODIES[name];
	const told = (symbol: string, unit: string, { value, uncertainty, source }: Figure) => {
		const spread = uncertainty === null ? 'no uncertainty given' : `± ${uncertainty}`;
		return `${symbol} = ${value}${unit} (${spread}; ${source})`;
	};
	return [
		told('GM', ' m³/s²', gm),
		told('R', ' m', radius),
		told('ω', ' rad/s', rate),
		...(j2 ? [told('J2', '', j2)] : [])
	];
}
