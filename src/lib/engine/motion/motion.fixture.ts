/** Line D1: Earth, 1300 kg/m³, design stress 50 GPa, lift 20 t, top 100 000 km up; and others like it. */
import { lineOf, type LineInput } from '../line/line';
import { fieldOf, type Site } from '../line/site';
import { sizeTaper } from '../line/taper';

export const EARTH: Site = { kind: 'body', body: 'earth', j2: false };

export function sized(
	site: Site,
	designStress: number,
	height: number,
	{ density = 1300, lift = 20e3 } = {}
): LineInput {
	const field = fieldOf(site);
	const top = field.base + height;
	const { baseArea, counterweight } = sizeTaper(field, {
		density,
		designStress,
		base: { lift },
		reserve: 0,
		top
	});
	return {
		site,
		density,
		section: { kind: 'taper', baseArea, designStress, top },
		masses: [],
		counterweight: Number(counterweight)
	};
}

export const D1 = sized(EARTH, 50e9, 1e8);
export const lineD1 = lineOf(D1);
