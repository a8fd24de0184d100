/**
 * A tether that spins about its middle in free space, its arms tapered for constant stress: Moravec, J.
 * Astronaut. Sci. 25 (1977), from memory. With the tip speed V, V_c = √(2σ_d/ρ) and x = V/V_c:
 * A(r)/A_tip = exp[x² (1 − r²/L²)], mass of an arm over the tip mass √π x exp(x²) erf x.
 * Frame: turning with the tether, g = −Ω²r. Left out: the gravity gradient, the hub's own size, what joins
 * tip and tether. In logarithms, since exp overflows beyond x = 26.
 */
import { erf } from '../numerics/erf';

export type SpinningArm = {
	/** kg/m³ */
	density: number;
	/** σ_d, Pa */
	designStress: number;
	/** V, m/s */
	tipSpeed: number;
	/** L, from the centre to the tip, m */
	length: number;
	/** kg */
	tipMass: number;
};

/** V_c = √(2σ_d/ρ), m/s */
export const characteristicSpeed = (density: number, designStress: number): number =>
	Math.sqrt((2 * designStress) / density);

/** ln of the section at the centre over that at the tip, x². */
export const lnAreaRatio = ({ density, designStress, tipSpeed }: SpinningArm): number =>
	(density * tipSpeed ** 2) / (2 * designStress);

/** ln of the mass of one arm over the tip mass. */
export function lnMassRatio(arm: SpinningArm): number {
	const x = arm.tipSpeed / characteristicSpeed(arm.density, arm.designStress);
	return lnAreaRatio(arm) + Math.log(Math.sqrt(Math.PI) * x) + Math.log(erf(x));
}

/** m V²/(L σ_d), m²: the section that holds the tip mass. */
export const tipArea = ({ tipMass, tipSpeed, length, designStress }: SpinningArm): number =>
	(tipMass * tipSpeed ** 2) / (length * designStress);

/** ln of the section at `share` of the length from the centre, m². */
export const lnAreaAt = (arm: SpinningArm, share: number): number =>
	Math.log(tipArea(arm)) + lnAreaRatio(arm) * (1 - share) * (1 + share);
