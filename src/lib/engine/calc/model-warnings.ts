/** What stands beside the results of a line model: what is left out, what to heed. */
import { BODIES, type BodyName } from '../line/bodies';
import type { Field } from '../line/field';
import { oneBodyWarnings } from '../line/site-warnings';

export function warnings(body: BodyName, field: Field, factorOfSafety: number): string[] {
	const { label, j2 } = BODIES[body];
	return [
		...oneBodyWarnings(body, field),
		...(factorOfSafety < 1
			? ['The factor of safety is below 1: the design stress is above the allowable.']
			: []),
		'Sized for a climber below synchronous height only: one above it adds its outward pull to everything below.',
		`Exact taper, straight line over the equator, ${label} alone${j2 ? ' with J2 left out' : ''}; density and section as deployed, under load.`
	];
}
