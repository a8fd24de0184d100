/** Release: the orbit of a mass let go at rest from the line, by radius, and the radii where its fate changes. */
import { FATES, fateFrom } from '../release/fate';
import { orbitFrom } from '../release/orbit';
import { entryRadius, escapeRadius, grazingRadius, interfaceInput } from '../release/thresholds';
import { checkRadii, radiiInput, releaseWarnings, turningBody } from '../release/turning-body';
import { site } from '../line/site';
import { LENGTH, PURE, SPECIFIC_STRENGTH, TIME, VELOCITY } from '../quantities/dimension';
import { defineMethod } from './method';
import { choice, group, list, quantity } from './parameter';

const length = (label: string, symbol?: string) =>
	quantity({ label, symbol, dimension: LENGTH, unit: 'km' });

export const release = defineMethod({
	name: 'release',
	title: 'Release',
	summary:
		'What becomes of a mass let go at rest from the line: it comes down, stays bound or escapes, with its orbit, by radius; and the radii at which that changes.',
	subject: 'release',
	inputs: { site, radii: radiiInput, interfaceHeight: interfaceInput },
	outputs: {
		balanceRadius: length('balance radius, without J2', 'r_s'),
		grazingRadius: {
			...length('radius below which a mass let go comes down'),
			help: 'From here its periapsis touches the entry interface.'
		},
		grazingHeight: length('height below which a mass let go comes down'),
		escapeRadius: length('radius from which on a mass let go escapes, 2^⅓ r_s'),
		escapeHeight: length('height from which on a mass let go escapes'),
		releases: list({
			label: 'by radius, in the order given',
			fewest: 1,
			most: 20_000,
			of: group({
				label: 'release',
				fields: {
					radius: length('radius', 'r'),
					height: length('height above the surface'),
					fate: choice({ label: 'fate', options: FATES }),
					speed: quantity({
						label: 'inertial speed when let go, ωr',
						symbol: 'v',
						dimension: VELOCITY,
						unit: 'km/s'
					}),
					c3: quantity({
						label: 'characteristic energy, ω²r² − 2GM/r',
						symbol: 'C3',
						dimension: SPECIFIC_STRENGTH,
						unit: 'km^2/s^2'
					}),
					eccentricity: quantity({
						label: 'eccentricity',
						symbol: 'e',
						dimension: PURE,
						unit: ''
					}),
					periapsis: length('periapsis, from the centre', 'r_p'),
					apoapsis: { ...length('apoapsis, from the centre', 'r_a'), optional: true },
					semiMajorAxis: { ...length('semi-major axis', 'a'), optional: true },
					period: quantity({
						label: 'period of the orbit',
						symbol: 'P',
						dimension: TIME,
						unit: 'h',
						optional: true
					}),
					excessSpeed: quantity({
						label: 'hyperbolic excess speed, √C3',
						symbol: 'v∞',
						dimension: VELOCITY,
						unit: 'km/s',
						optional: true,
						help: 'What is left of the speed far from the body; only where the mass escapes.'
					})
				}
			})
		})
	},
	sources: [
		'motion of two bodies on conic sections (Kepler); C3 = v² − 2GM/r',
		'with q = ω²r³/GM: apsides r and r q/(2 − q), eccentricity |q − 1|'
	],
	validity:
		'Let go at rest on a line in the plane of the equator that turns with the body: radial speed 0, tangential speed ωr in the inertial frame, from where the mass moves about the body’s centre alone.',
	leftOut: [
		'J2 and higher harmonics, in the orbit and in r_s',
		'the Sun, moons and a moon’s primary, which count far from the body',
		'the air, also below the interface',
		'swing and stretch of the line, and its recoil when the mass goes'
	],
	refuses: [
		'a balance radius inside the body, or below the entry interface',
		'a radius inside the body',
		'a line between a moon and its primary, where two bodies pull'
	],
	caution:
		'What is let go below the grazing radius comes down on somebody’s ground or sea. This is a screening: range safety rules and licensed practice govern.',
	run({ site, radii, interfaceHeight }) {
		const body = turningBody(site);
		const entry = entryRadius(body, interfaceHeight);
		checkRadii(body, radii, 'radii');
		const escape = escapeRadius(body);
		const grazing = grazingRadius(body, entry[0]);
		return {
			outputs: {
				balanceRadius: body.balance,
				grazingRadius: grazing,
				grazingHeight: grazing - body.radius,
				escapeRadius: escape,
				escapeHeight: escape - body.radius,
				releases: radii.map((radius) => ({
					radius,
					height: radius - body.radius,
					fate: fateFrom(body, radius, entry),
					...orbitFrom(body, radius)
				}))
			},
			warnings: releaseWarnings(site, Math.max(...radii))
		};
	}
});
