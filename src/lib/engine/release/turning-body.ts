/**
 * The body that a mass let go from a line moves about: a point mass that turns. Its oblateness is left
 * out here, in the orbit and in the balance radius alike.
 */
import { siteWarnings } from '../line/site-warnings';
import { bodyField } from '../line/field';
import { spheroidOf, type Site } from '../line/site';
import { list, quantity } from '../methods/parameter';
import { Refused, refuseInput } from '../methods/refused';
import { LENGTH } from '../quantities/dimension';

export type TurningBody = {
	/** Gravitational parameter, m³/s². */
	gm: number;
	/** Equatorial radius, m. */
	radius: number;
	/** Sidereal rate of rotation, rad/s. */
	rate: number;
	/** Radius of the synchronous orbit, (GM/ω²)^⅓, m. */
	balance: number;
};

/** Products of four such figures, and their parts below the last digit, still are numbers. */
const LARGEST = 1e40;

/** @throws Refused where there is no line to let go from, or more than one body. */
export function turningBody(site: Site): TurningBody {
	if (site.kind === 'moon')
		throw new Refused(
			'A mass let go from a line between a moon and its primary is pulled by both: what becomes of it is told for one body only.',
			{ remedy: 'Take the moon as one body, and mind that the primary is then left out.' }
		);
	const { gm, radius, rate } = spheroidOf(site);
	const balance = Math.cbrt(gm / rate ** 2);
	const told = [gm, radius, rate, balance].every((x) => x < LARGEST && x > 1 / LARGEST);
	if (!told) throw new Refused('The body is beyond all measure: its figures cannot be told.');
	if (balance > radius * (1 + 1e-9)) return { gm, radius, rate, balance };
	throw new Refused('The balance radius lies inside the body: nothing holds a line up.', {
		remedy: 'Look at the rate of rotation, the radius and the gravitational parameter.'
	});
}

export const radiiInput = list({
	label: 'radii at which a mass is let go, from the body’s centre',
	symbol: 'r',
	fewest: 1,
	most: 20_000,
	of: quantity({
		label: 'radius',
		dimension: LENGTH,
		unit: 'km',
		range: { above: 0, most: LARGEST }
	})
});

/** @throws Refused where a radius lies inside the body. */
export function checkRadii({ radius }: TurningBody, radii: readonly number[], path: string): void {
	radii.forEach((r, i) => {
		if (r < radius) refuseInput(`${path}.${i}`, `Radius ${i + 1} lies inside the body.`);
	});
}

/** What the place should make one heed when a mass is let go at up to `furthest`, m. */
export function releaseWarnings(site: Site, furthest: number): string[] {
	if (site.kind === 'moon') return [];
	const oblate = spheroidOf(site);
	return [
		...(oblate.j2 > 0 ? ['J2 does not count here: orbits are those about a point mass.'] : []),
		...siteWarnings(site, bodyField({ ...oblate, j2: 0 }), furthest)
	];
}
