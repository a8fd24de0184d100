import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exactly } from '../numerics/double-double';
import { bodyOf } from './bodies.fixture';
import { fallFrom } from './fall';
import { grazingRadius } from './thresholds';
import type { TurningBody } from './turning-body';

/** Even over the range: doubles at random as they are stored lie near zero, most of them. */
const between = (min: number, max: number) => fc.nat(1e9).map((n) => min + (max - min) * (n / 1e9));
const share = between(0, 1);
/** From a boulder to a giant; the balance radius from just above the surface to 10⁴ radii. */
const someBody = fc
	.tuple(between(1, 9), between(300, 2e4), between(-2, 4))
	.map(([size, density, ratio]) => bodyOf(size, density, 10 ** ratio));

/** A body, an entry interface, and radii between that and the grazing one. */
const someFalls = fc
	.tuple(someBody, share, fc.array(share, { minLength: 1, maxLength: 6 }))
	.map(([body, height, shares]) => {
		const entry = body.radius + height * 0.9 * (body.balance - body.radius);
		const grazing = grazingRadius(body, entry);
		const radii = shares.map((at) => entry + at * (grazing - entry) * (1 - 1e-9));
		return { body, entry, radii: radii.sort((a, b) => a - b) };
	});

const falls = ({ body, entry, radii }: { body: TurningBody; entry: number; radii: number[] }) =>
	radii.map((r) => ({ r, ...fallFrom(body, r, exactly(entry))! }));

describe('the fall of an element of a severed line', () => {
	it('keeps energy and angular momentum', () => {
		fc.assert(
			fc.property(someFalls, (it) => {
				const { gm, rate } = it.body;
				for (const { r, speed, pathAngle } of falls(it)) {
					const kinetic = speed ** 2;
					const energy = kinetic - (2 * gm) / it.entry;
					expect(Math.abs(energy - ((rate * r) ** 2 - (2 * gm) / r))).toBeLessThan(
						1e-12 * (gm / it.entry)
					);
					expect((speed * Math.cos(pathAngle) * it.entry) / (rate * r ** 2)).toBeCloseTo(1, 9);
				}
			})
		);
	});

	it('takes longer, is faster and falls further east the higher it starts', () => {
		fc.assert(
			fc.property(someFalls, (it) => {
				falls(it).reduce((lower, higher) => {
					// Sums of some twenty operations: alike within rounding where the radii are.
					const least = 1 - 1e-12;
					expect(higher.time).toBeGreaterThanOrEqual(lower.time * least);
					expect(higher.speed).toBeGreaterThanOrEqual(lower.speed * least);
					expect(higher.longitudeOffset).toBeGreaterThanOrEqual(lower.longitudeOffset * least);
					return higher;
				});
			})
		);
	});

	it('falls east of the anchor by less than half a turn', () => {
		fc.assert(
			fc.property(someFalls, (it) => {
				for (const { longitudeOffset } of falls(it)) {
					expect(longitudeOffset).toBeGreaterThanOrEqual(0);
					expect(longitudeOffset).toBeLessThan(Math.PI);
				}
			})
		);
	});

	it('falls straight down, at g, from just above the interface', () => {
		const body = { gm: 4e14, radius: 6.4e6, rate: 7e-5, balance: Math.cbrt(4e14 / 7e-5 ** 2) };
		const height = 2 ** -10;
		const { time, relativeSpeed, relativePathAngle, longitudeOffset } = fallFrom(
			body,
			body.radius + height,
			exactly(body.radius)
		)!;
		// By hand: t = √(2h/g), and the eastward drift of a plumb line's end, ω g t³/3.
		const g = body.gm / body.radius ** 2 - body.rate ** 2 * body.radius;
		expect(time / Math.sqrt((2 * height) / g)).toBeCloseTo(1, 7);
		expect(relativeSpeed / Math.sqrt(2 * g * height)).toBeCloseTo(1, 7);
		expect(relativePathAngle).toBeCloseTo(Math.PI / 2, 5);
		const drift = (body.rate * g * time ** 3) / 3;
		expect((longitudeOffset * body.radius) / drift).toBeCloseTo(1, 6);
	});

	it('is at the interface already where it starts on it', () => {
		const body = { gm: 4e14, radius: 6.4e6, rate: 7e-5, balance: Math.cbrt(4e14 / 7e-5 ** 2) };
		expect(fallFrom(body, body.radius, exactly(body.radius))).toMatchObject({
			time: 0,
			longitudeOffset: 0,
			relativeSpeed: 0,
			relativePathAngle: Math.PI / 2
		});
	});
});
