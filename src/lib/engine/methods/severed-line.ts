/** Severed line: the fate of each element as if let go on its own, by radius. A screening. */
import { add, exactly, negative } from '../numerics/double-double';
import { FATES, fateFrom } from '../release/fate';
import { fallFrom } from '../release/fall';
import { entryRadius, escapeRadius, grazingRadius, interfaceInput } from '../release/thresholds';
import { checkRadii, radiiInput, releaseWarnings, turningBody } from '../release/turning-body';
import { site } from '../line/site';
import { LENGTH, PURE, TIME, VELOCITY } from '../quantities/dimension';
import { defineMethod } from './method';
import { choice, group, list, quantity } from './parameter';

const length = (label: string, symbol?: string) =>
	quantity({ label, symbol, dimension: LENGTH, unit: 'km' });
const speed = (label: string, symbol: string) =>
	quantity({ label, symbol, dimension: VELOCITY, unit: 'km/s' });
const angle = (label: string, symbol: string) =>
	quantity({ label, symbol, dimension: PURE, unit: 'deg' });

export const severedLine = defineMethod({
	name: 'severed-line',
	title: 'Severed line, screening',
	summary:
		'The fate of each element of a severed line as if it were let go on its own: whether it comes down, and then how fast, when and how far east; stays bound; or escapes.',
	subject: 'release',
	inputs: {
		site,
		radii: { ...radiiInput, label: 'radii of the elements looked at, from the body’s centre' },
		interfaceHeight: interfaceInput
	},
	outputs: {
		entryRadius: length('radius of the entry interface', 'r_e'),
		grazingRadius: length('radius below which elements come down'),
		escapeRadius: length('radius from which on elements escape'),
		elements: list({
			label: 'by radius, in the order given',
			fewest: 1,
			most: 20_000,
			of: group({
				label: 'element',
				fields: {
					radius: length('radius', 'r'),
					height: length('height above the surface'),
					fate: choice({
						label: 'fate',
						options: {
							belowInterface: 'is below the entry interface already, and falls from there',
							...FATES
						}
					}),
					entry: group({
						label: 'entry at the interface, where it comes down',
						optional: true,
						fields: {
							speed: speed('inertial speed', 'v_e'),
							relativeSpeed: speed('speed relative to the turning air', 'v_rel'),
							pathAngle: angle('angle of the inertial speed below the horizontal', 'γ'),
							relativePathAngle: angle('angle of the relative speed below the horizontal', 'γ_rel'),
							time: quantity({
								label: 'time from letting go',
								symbol: 't',
								dimension: TIME,
								unit: 'h'
							}),
							longitudeOffset: {
								...angle('longitude east of the anchor, not wrapped', 'Δλ'),
								help: '(ν − π) − ωt: what it has turned by about the centre, less what the body has.'
							}
						}
					})
				}
			})
		})
	},
	sources: [
		'motion of two bodies on conic sections (Kepler)',
		'v_e² = ω²r² + 2GM (1/(R + h_e) − 1/r); half-angle forms of Kepler’s equation from the apoapsis'
	],
	validity:
		'Each element by itself, at rest in the turning frame when the line parts, in the plane of the equator; from there it moves about the body’s centre alone down to the entry interface. The air there turns with the body.',
	leftOut: [
		'that a severed line stays connected: it pulls, wraps round the body and whips, and its pieces may enter faster and elsewhere',
		'the air above the interface and all that happens below it: burning up, drift, impact',
		'J2, the Sun and moons',
		'further breaks'
	],
	refuses: [
		'a balance radius inside the body, or below the entry interface',
		'a radius inside the body',
		'a line between a moon and its primary, where two bodies pull'
	],
	caution:
		'A connected line wraps and whips: no piece of it need do what is told here for an element on its own. This is a screening and not a prediction of where anything falls; range safety rules and licensed practice govern.',
	run({ site, radii, interfaceHeight }) {
		const body = turningBody(site);
		const entry = entryRadius(body, interfaceHeight);
		checkRadii(body, radii, 'radii');
		const isBelow = (radius: number) => add(exactly(radius), negative(entry))[0] < 0;
		return {
			outputs: {
				entryRadius: entry[0],
				grazingRadius: grazingRadius(body, entry[0]),
				escapeRadius: escapeRadius(body),
				elements: radii.map((radius) => ({
					radius,
					height: radius - body.radius,
					...(isBelow(radius)
						? { fate: 'belowInterface' as const, entry: undefined }
						: { fate: fateFrom(body, radius, entry), entry: fallFrom(body, radius, entry) })
				}))
			},
			warnings: releaseWarnings(site, Math.max(...radii))
		};
	}
});
