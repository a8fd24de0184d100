/** What a line's place should make one heed. */
import { distance, kilometres } from '../quantities/format';
import { BODIES, type BodyName } from './bodies';
import type { Field } from './field';
import type { Site } from './site';

/** A moon taken as one body, with its balance radius where the primary already pulls more. */
export function oneBodyWarnings(body: BodyName, field: Field): string[] {
	const { label, l1 } = BODIES[body];
	if (!l1 || field.balance <= l1.value) return [];
	return [
		`${label} as one body: the synchronous radius of ${kilometres(field.balance)} lies beyond its L1 at ` +
			`${kilometres(l1.value)}, where the primary pulls more. These figures do not describe a line there.`
	];
}

/** @param top highest radius looked at, m */
export function siteWarnings(site: Site, field: Field, top: number): string[] {
	const warnings = site.kind === 'body' ? oneBodyWarnings(site.body, field) : [];
	if (site.kind === 'moon' && site.side === 'near' && top > field.balance)
		warnings.push(
			`The radius ${distance(top)} is ${distance(field.limit - top)} from the centre of the primary, whose own radius is not looked at.`
		);
	if (site.kind !== 'moon' && top > 1000 * field.balance)
		warnings.push('More than a thousand balance radii away one body alone says nothing.');
	return warnings;
}
