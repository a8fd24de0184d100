/**
 * A line as manufactured: sections of constant area, sized outwards from the base so that the greatest stress in each
 * is σ_d. With T_i the tension at a section's lower end, A_i = T_i/(σ_d − ρ max[U(r) − U(r_i)]), the greatest rise being at
 * the section's upper end below r_s, at r_s where the section spans it, and at its lower end above. Joints are point
 * masses at the interior boundaries. As the sections grow in number it tends to the exact taper.
 *
 * Tensions and masses are held by their logarithms, as in the taper.
 */
import { Refused } from '../methods/refused';
import { lnSum } from '../numerics/logarithm';
import { distance } from '../quantities/format';
import type { Field } from './field';
import { radiusAtDepth } from './level';

export type Section = {
	/** m */
	from: number;
	/** m */
	to: number;
	/** Logarithms of area, m², mass, kg, and tension at its lower and upper end, N. */
	lnArea: number;
	lnMass: number;
	lnLower: number;
	lnUpper: number;
	/** Pa; the greatest, in every section, is σ_d. */
	lowerStress: number;
	upperStress: number;
};

export type SteppedInput = {
	/** kg/m³ */
	density: number;
	/** Pa */
	designStress: number;
	/** ln of the tension at the anchor, N: σ_d A₀ */
	lnBaseTension: number;
	/** r₀ = R < r₁ < … < r_N = r_t, m; r_t above r_s */
	boundaries: readonly number[];
	/** kg, at each interior boundary */
	jointMass: number;
};

export type Stepped = {
	sections: Section[];
	/** Logarithms of masses, kg. */
	lnSections: number;
	lnCounterweight: number;
};

/** @throws Refused where a section cannot carry itself, or the line would end before its top. */
export function sizeStepped(field: Field, input: SteppedInput): Stepped {
	const { density, designStress, boundaries, jointMass } = input;
	let lnTension = input.lnBaseTension;
	let lnSections = -Infinity;
	const count = boundaries.length - 1;
	const sections = Array.from({ length: count }, (_, i): Section => {
		const [from, to] = [boundaries[i]!, boundaries[i + 1]!];
		const peak = Math.max(from, Math.min(to, field.balance));
		const spare = designStress - density * field.rise(from, peak);
		const upperStress = spare + density * field.rise(from, to);
		if (!(spare > 0) || !(upperStress > 0)) refuseSection(field, input, i);
		const lnArea = lnTension - Math.log(spare);
		const lnMass = lnArea + Math.log(density) + Math.log(to - from);
		const lnUpper = lnArea + Math.log(upperStress);
		const stresses = { lowerStress: spare, upperStress };
		const section = { from, to, lnArea, lnMass, lnLower: lnTension, lnUpper, ...stresses };
		lnTension = i < count - 1 ? afterJoint(field, to, lnUpper, jointMass, i + 1) : lnUpper;
		lnSections = lnSum(lnSections, lnMass);
		return section;
	});
	const lnCounterweight = lnTension - Math.log(-field.g(boundaries[count]!));
	return { sections, lnSections, lnCounterweight };
}

/** The tension above a joint; above r_s a joint pulls outwards and may take more than there is. */
function afterJoint(field: Field, r: number, lnTension: number, mass: number, number: number) {
	if (mass === 0) return lnTension;
	const gain = (mass * field.g(r)) / Math.exp(lnTension);
	if (gain > -1) return lnTension + Math.log1p(gain);
	throw new Refused(
		`Joint ${number}, at the radius ${distance(r)}, pulls outwards by more than the tension there: the line above it would be slack.`,
		{ remedy: 'Make the joints lighter, or the top lower.' }
	);
}

/** @throws Refused, always */
function refuseSection(field: Field, input: SteppedInput, i: number): never {
	const { density, designStress, boundaries } = input;
	const [from, to] = [boundaries[i]!, boundaries[i + 1]!];
	// How far U may rise, or fall, until the section has nothing left.
	const span = designStress / density;
	const depth = field.depth(from);
	const heavy =
		from < field.balance && density * field.rise(from, Math.min(to, field.balance)) >= designStress;
	const end = heavy
		? radiusAtDepth(field, depth - span, from)
		: radiusAtDepth(field, from < field.balance ? span : depth + span, to);
	const what = heavy
		? 'cannot carry itself'
		: 'pulls outwards by more than the tension at its lower end, so that the line would be slack before its upper end';
	throw new Refused(
		`Section ${i + 1}, from the radius ${distance(from)} to ${distance(to)}, ${what}: there it must stay under ${distance(end - from)}.`,
		{ remedy: 'Part the line into more sections, or raise the design stress.' }
	);
}
