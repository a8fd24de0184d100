/** Where a line model stands: a body known here, one of one's own, or a moon with its primary. */
import { BODIES } from '../line/bodies';
import type { Field } from '../line/field';
import { fieldOf, type Site } from '../line/site';
import { siteWarnings } from '../line/site-warnings';
import { Refused } from '../methods/refused';
import { kilometres } from '../quantities/format';
import { fault } from './faults';
import type { LineModelItem } from './items';
import { MODEL_INPUTS, PLACE_FIELDS, type ModelField, type ModelValues } from './model-inputs';
import type { Fault } from './results';

/** The fields that say where it stands. */
export function placeFields({ body }: LineModelItem): readonly ModelField[] {
	if (body === 'own') return PLACE_FIELDS.own;
	return body === 'moonNear' || body === 'moonFar' ? PLACE_FIELDS.moon : [];
}

/** Null where something is not given yet. */
export function siteOf({ body, j2 }: LineModelItem, values: ModelValues): Site | null {
	const { gm, radius, period, oblateness, primaryGm, distance } = values;
	if (body === 'own') {
		if (!gm || !radius || !period) return null;
		return {
			kind: 'own',
			gm,
			radius,
			period,
			j2: oblateness ?? 0,
			mass: undefined,
			rate: undefined
		};
	}
	if (body !== 'moonNear' && body !== 'moonFar') return { kind: 'body', body, j2: j2 === 'with' };
	const { moon, earth } = BODIES;
	return {
		kind: 'moon',
		side: body === 'moonNear' ? 'near' : 'far',
		moonGm: gm ?? moon.gm.value,
		moonRadius: radius ?? moon.radius.value,
		primaryGm: primaryGm ?? earth.gm.value,
		distance: distance ?? MODEL_INPUTS.distance.default
	};
}

/** The field of the place, or why no line can stand there. */
export function fieldAt(site: Site): Field | Fault {
	try {
		return fieldOf(site);
	} catch (error) {
		if (!(error instanceof Refused)) throw error;
		const { message, remedy } = error.refusal;
		return fault('refused', message, { remedy });
	}
}

/** What holds the line up above: synchronous height over a body, the balance point on the way from a moon. */
const balanceName = ({ kind }: Site) =>
	kind === 'moon' ? 'the balance point' : 'synchronous height';

/** Why a line cannot end at this radius; null when it can. */
export function topRefusal(site: Site, field: Field, top: number): Fault | null {
	const [height, balance] = [top - field.base, field.balance - field.base].map(kilometres);
	if (top <= field.balance * (1 + 1e-9)) {
		return fault(
			'refused',
			`The top is ${height} up, not above ${balanceName(site)} at ${balance}: ` +
				'nothing there pulls outwards to hold the line up.',
			{ remedy: `Set the top above ${balance}.` }
		);
	}
	if (top >= field.limit) {
		return fault('refused', 'The line reaches the centre of the primary.', {
			remedy: `Set the top below ${kilometres(field.limit - field.base)}.`
		});
	}
	if (site.kind === 'moon' || top <= field.balance * 1000) return null;
	return fault(
		'refused',
		`The top is ${height} up, more than a thousand synchronous radii: one body alone says nothing there.`
	);
}

/** What of the place stands beside the figures. */
export function placeWarnings(site: Site, field: Field, top: number): string[] {
	return [
		...siteWarnings(site, field, top),
		`Exact taper, straight line ${frameOf(site)}; density and section as deployed, under load.`
	];
}

function frameOf(site: Site): string {
	if (site.kind === 'moon')
		return 'in the orbit of the moon, which is taken as a circle, its primary and itself as points';
	if (site.kind === 'own')
		return `over the equator, the body alone${site.j2 > 0 ? ' with J2' : ' without J2'}`;
	const { label, j2 } = BODIES[site.body];
	const oblate = !j2 ? '' : site.j2 ? ' with J2' : ' with J2 left out';
	return `over the equator, ${label} alone${oblate}`;
}
