import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exactly } from '../numerics/double-double';
import { bodyOf } from './bodies.fixture';
import { fateFrom } from './fate';
import { c3At, orbitFrom } from './orbit';
import { escapeRadius, grazingRadius, radiusForC3 } from './thresholds';

/** Even over the range: doubles at random as they are stored lie near zero, most of them. */
const between = (min: number, max: number) => fc.nat(1e9).map((n) => min + (max - min) * (n / 1e9));
const share = between(0, 1);
/** From a boulder to a giant; the balance radius from just above the surface to 10⁴ radii. */
const someBody = fc
	.tuple(between(1, 9), between(300, 2e4), between(-2, 4))
	.map(([size, density, ratio]) => bodyOf(size, density, 10 ** ratio));

describe('the orbit of a mass let go', () => {
	it('has the energy and the angular momentum of letting go at both apsides', () => {
		fc.assert(
			fc.property(someBody, share, (body, at) => {
				const r = body.radius + at * 0.999 * (escapeRadius(body) - body.radius);
				const { periapsis, apoapsis, semiMajorAxis, c3, speed } = orbitFrom(body, r);
				// Momentum gives the speed at either apsis, and that must give the energy.
				for (const apsis of [periapsis, apoapsis!]) {
					const kinetic = ((speed * r) / apsis) ** 2;
					const pull = (2 * body.gm) / apsis;
					expect(Math.abs(kinetic - pull - c3)).toBeLessThan(1e-12 * Math.max(kinetic, pull));
				}
				expect((periapsis + apoapsis!) / (2 * semiMajorAxis!)).toBeCloseTo(1, 12);
			})
		);
	});

	it('has its apoapsis where it was let go below the balance radius, its periapsis above', () => {
		fc.assert(
			fc.property(someBody, share, (body, at) => {
				const r = body.radius + at * 2 * (body.balance - body.radius);
				const { periapsis, apoapsis } = orbitFrom(body, r);
				expect(r < body.balance ? apoapsis : periapsis).toBe(r);
			})
		);
	});

	it('escapes exactly where C3 is not below zero, which is from 2^⅓ r_s on', () => {
		fc.assert(
			fc.property(someBody, fc.oneof(between(-1e-3, 1e-3), between(-1e-12, 1e-12)), (body, off) => {
				fc.pre(Math.abs(off) > 1e-14 && off > body.radius / escapeRadius(body) - 1);
				const r = escapeRadius(body) * (1 + off);
				const { c3, apoapsis, excessSpeed, eccentricity } = orbitFrom(body, r);
				expect(c3 >= 0).toBe(off > 0);
				expect(apoapsis === undefined).toBe(off > 0);
				expect(excessSpeed === undefined).toBe(off < 0);
				expect(eccentricity >= 1).toBe(off > 0);
			})
		);
	});

	it('comes down less the higher it was let go: the fates follow each other once', () => {
		const order = ['comesDown', 'staysBound', 'escapes'];
		fc.assert(
			fc.property(someBody, share, fc.array(share, { minLength: 2 }), (body, height, shares) => {
				const entry = body.radius + height * 0.9 * (body.balance - body.radius);
				const radii = shares
					.map((s) => entry + s * 2 * (escapeRadius(body) - entry))
					.sort((a, b) => a - b);
				const fates = radii.map((r) => order.indexOf(fateFrom(body, r, exactly(entry))));
				expect(fates).toEqual([...fates].sort());
			})
		);
	});

	it('touches the entry interface from the grazing radius', () => {
		fc.assert(
			fc.property(someBody, share, (body, height) => {
				const entry = body.radius + height * 0.99 * (body.balance - body.radius);
				const grazing = grazingRadius(body, entry);
				expect(orbitFrom(body, grazing).periapsis / entry).toBeCloseTo(1, 12);
				expect(grazing).toBeGreaterThan(entry);
				expect(grazing).toBeLessThan(body.balance);
			})
		);
	});

	it('has the C3 for which a radius was asked', () => {
		fc.assert(
			fc.property(someBody, between(-6, 4), (body, exponent) => {
				const times = 10 ** exponent;
				const wanted = times * (body.rate * body.balance) ** 2;
				const r = radiusForC3(body, wanted);
				const [c3] = c3At(body, r);
				expect(Math.abs(c3 - wanted)).toBeLessThan(1e-13 * (wanted + (2 * body.gm) / r));
				expect(r).toBeGreaterThanOrEqual(escapeRadius(body) * (1 - 1e-15));
			})
		);
	});

	it('is a circle on the balance radius, in one turn of the body', () => {
		fc.assert(
			fc.property(someBody, (body) => {
				const { eccentricity, period } = orbitFrom(body, body.balance);
				expect(eccentricity).toBeLessThan(1e-14);
				expect((period! * body.rate) / (2 * Math.PI)).toBeCloseTo(1, 13);
			})
		);
	});
});
