/**
 * What a line stretches by: ε = σ/E + α ΔT along it as deployed; its length as manufactured is L₀ = ∫ dr/(1 + ε).
 * E and α are constant and the same in tension and slack; Poisson contraction is in the deployed section already.
 */
import { Refused } from '../methods/refused';
import { integrate } from '../numerics/quadrature';
import { distance } from '../quantities/format';
import { topOf, type Line } from './line';
import { tensionAt, type Hanging, type Stretch } from './tension';

export type Elasticity = {
	/** E, Pa */
	modulus: number;
	/** α ΔT: strain from the change of temperature since manufacture. */
	thermalStrain: number;
};

export const strainOf = ({ modulus, thermalStrain }: Elasticity, stress: number): number =>
	stress / modulus + thermalStrain;

/**
 * L − L₀ = ∫ ε/(1 + ε) dr, m; negative where the line was longer.
 * @throws Refused where the strain reaches −100 %.
 */
export function elongation(line: Line, { stretches }: Hanging, elasticity: Elasticity): number {
	const strain = (stress: number) => strainOf(elasticity, stress);
	const ends = stretches.flatMap(({ from, to, lower, upper, lowerArea, upperArea }) => [
		{ r: from, strain: strain(lower / lowerArea) },
		{ r: to, strain: strain(upper / upperArea) }
	]);
	const crushed = ends.find((end) => end.strain <= -1);
	if (crushed)
		throw new Refused(
			`At the radius ${distance(crushed.r)} the strain comes to −100 % or less: there is no length as manufactured.`,
			{ remedy: 'Look at the modulus, the change of temperature and the slack.' }
		);
	const shortening = ends.map(({ strain }) => strain / (1 + strain));
	const greatest = shortening.reduce((most, share) => Math.max(most, Math.abs(share)), 0);
	let sum = 0;
	for (const stretch of stretches) {
		const { from, to, piece } = stretch;
		// Rounding of the stress, and of r where the stretch is short against its radius.
		const noise = greatest * (1e-13 + (2 ** -50 * to) / (to - from));
		const share = (r: number) => {
			const here = strain(tensionAt(line, stretch, r) / piece.area(r));
			return here / (1 + here);
		};
		sum += integrate(share, panelsOf(stretch), 1e-11, noise).value;
	}
	return sum;
}

/** Halving towards both ends of a taper, where a tension that is not its own dies away however steeply. */
function panelsOf({ from, to, piece }: Stretch): number[] {
	const middle = (from + to) / 2;
	if (piece.slope !== null) return [from, middle, to];
	const shares = Array.from({ length: 12 }, (_, i) => 2 ** (i - 13));
	const lower = shares.map((share) => from + share * (to - from));
	const upper = shares.map((share) => to - share * (to - from));
	return [from, ...lower, middle, ...upper.reverse(), to];
}

/** Length as deployed, m. */
export const lengthOf = (line: Line): number => topOf(line) - line.pieces[0]!.from;
