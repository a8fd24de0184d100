/** What stands beside the results of a line model: what is left out, what to heed. */
import { BODIES, type BodyName } from '../line/bodies';
import { kilometres } from '../quantities/format';
import type { Field } from '../line/field';

export function warnings(body: BodyName, field: Field, factorOfSafety: number): string[] {
	const { label, j2, l1 } = BODIES[body];
	return [
		...(l1 && field.balance > l1.value
			? [
					`${label} as one body: the synchronous radius of ${kilometres(field.balance)} lies beyond its L1 at ` +
						`${kilometres(l1.value)}, where the primary pulls more. These figures do not describe a line there.`
				]
			: []),
		...(factorOfSafety < 1
			? ['The factor of safety is below 1: the design stress is above the allowable.']
			: []),
		'Sized for a climber below synchronous height only: one above it adds its outward pull to everything below.',
		`Exact taper, straight line over the equator, ${label} alone${j2 ? ' with J2 left out' : ''}; density and section as deployed, under load.`
	];
}
