import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integrate } from '../numerics/quadrature';
import { analyse } from './as-built';
import { bodyField, moonField, type Field } from './field';
import type { Line } from './line';
import { constantPiece, linearPiece, taperPiece, type Piece } from './piece';
import { sizeTaper, taperShape } from './taper';
import { topWithin } from './trade';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
/** Ten to a power between the two. */
const decades = (min: number, max: number) => between(min, max).map((power) => 10 ** power);

/** A body whose balance radius is so many times its own. */
const oneBody = fc
	.record({ radius: decades(3, 8), ratio: between(1.05, 60), j2: fc.constantFrom(0, 1e-3) })
	.map(({ radius, ratio, j2 }) => {
		const gm = 1.4e-6 * radius ** 3;
		return bodyField({ gm, radius, rate: Math.sqrt(gm / (radius * ratio) ** 3), j2 });
	});

const moon = fc
	.record({
		share: decades(-6, -1),
		distance: decades(6, 9),
		radius: decades(-2, -0.3),
		side: fc.constantFrom('near' as const, 'far' as const)
	})
	.map(({ share, distance, radius, side }) => {
		const moonRadius = radius * distance * Math.cbrt(share / 3);
		const primaryGm = 1e-7 * distance ** 3;
		return moonField({ moonGm: share * primaryGm, primaryGm, moonRadius, distance }, side);
	});

const field = fc.oneof(oneBody, moon);

/** Above the balance radius, and on a near side well before the primary. */
const topOn = (field: Field, share: number) =>
	field.balance + share * Math.min(2 * field.balance, 0.9 * (field.limit - field.balance));

const design = fc.record({ steepness: decades(-2, 1), share: between(0.05, 1) });

function sized(field: Field, { steepness, share }: { steepness: number; share: number }) {
	const density = 1500;
	const top = topOn(field, share);
	const deepest = Math.max(field.depth(field.base), field.depth(top));
	const designStress = (density * deepest) / steepness;
	const input = { density, designStress, base: { lift: 1e3 }, reserve: 0, top };
	return { input, result: sizeTaper(field, input) };
}

describe('the exact taper', () => {
	it('grows thinner and lighter with a stronger material', () => {
		fc.assert(
			fc.property(field, design, between(1.01, 3), (field, design, factor) => {
				const { input, result } = sized(field, design);
				const stronger = sizeTaper(field, { ...input, designStress: input.designStress * factor });
				expect(Number(stronger.taper)).toBeLessThan(Number(result.taper));
				expect(Number(stronger.mass)).toBeLessThan(Number(result.mass));
			})
		);
	});

	it('grows thicker with a denser one', () => {
		fc.assert(
			fc.property(field, design, between(1.01, 3), (field, design, factor) => {
				const { input, result } = sized(field, design);
				const denser = sizeTaper(field, { ...input, density: input.density * factor });
				expect(Number(denser.taper)).toBeGreaterThan(Number(result.taper));
			})
		);
	});

	it('is lighter in total the longer it is', () => {
		fc.assert(
			fc.property(field, design, between(0.3, 0.95), (field, design, factor) => {
				const { input, result } = sized(field, design);
				const shorter = { ...input, top: field.balance + factor * (input.top - field.balance) };
				// Where the counterweight is nothing already, a longer line changes no digit.
				expect(Number(sizeTaper(field, shorter).total)).toBeGreaterThanOrEqual(
					Number(result.total) * (1 - 1e-12)
				);
			})
		);
	});

	it('hangs from its counterweight: m_c (−g) = σ_d A at the top', () => {
		fc.assert(
			fc.property(field, design, (field, design) => {
				const { input, result } = sized(field, design);
				const pull = Number(result.counterweight) * -field.g(input.top);
				expect(pull / (input.designStress * Number(result.topArea))).toBeCloseTo(1, 11);
			})
		);
	});

	it('comes within the share asked for exactly where it is said to', () => {
		fc.assert(
			fc.property(field, design, decades(-2, 0.5), (field, design, share) => {
				const { input, result } = sized(field, design);
				const { density, designStress, top } = input;
				const shape = taperShape(field, density, designStress);
				const found = topWithin(field, shape, { designStress, rangeTop: top, share });
				fc.pre(found > field.balance * (1 + 1e-6));
				const there = sizeTaper(field, { ...input, top: found });
				expect(Number(there.total) / Number(result.total) - 1).toBeCloseTo(share, 8);
			})
		);
	});

	it('carries its design stress everywhere when it is analysed as built', () => {
		fc.assert(
			fc.property(field, design, (field, design) => {
				const { input, result } = sized(field, design);
				const { density, designStress, top } = input;
				const shape = { k: density / designStress, peakArea: Number(result.synchronousArea) };
				const line: Line = {
					field,
					density,
					pieces: [
						taperPiece(field, shape, field.base, field.balance),
						taperPiece(field, shape, field.balance, top)
					],
					masses: [],
					counterweight: Number(result.counterweight)
				};
				// The tension at the anchor is what is left of the greatest: so much rounding is in it.
				const lost = 1e-13 * Number(result.taper);
				for (const { stress } of analyse(line, designStress, 20).rows)
					expect(Math.abs(stress / designStress - 1)).toBeLessThan(1e-12 + lost);
			})
		);
	});
});

describe('the integrals over a piece', () => {
	const pieces: [string, (field: Field, a: number, b: number) => Piece][] = [
		['of one section', (field, a, b) => constantPiece(field, a, b, 3e-6)],
		['that widens', (field, a, b) => linearPiece(field, [a, 1e-6], [b, 5e-6])],
		['that narrows', (field, a, b) => linearPiece(field, [a, 5e-6], [b, 1e-7])],
		[
			'with a taper',
			(field, a, b) => {
				const deepest = Math.max(field.depth(a), field.depth(b));
				const shape = { k: 3 / deepest, peakArea: 2e-6 };
				return taperPiece(field, shape, a, b);
			}
		]
	];

	it.each(pieces)('%s agree with an adaptive rule', (_, pieceOn) => {
		fc.assert(
			fc.property(field, between(0, 0.9), between(0.05, 1), (field, start, share) => {
				const top = topOn(field, 1);
				const a = field.base + start * (top - field.base);
				const b = a + share * (top - a);
				const piece = pieceOn(field, a, b);
				const edges = [...new Set([a, Math.min(b, Math.max(a, field.balance)), b])];
				const volume = integrate(piece.area, edges, 1e-13).value;
				expect(piece.volume(a, b) / volume).toBeCloseTo(1, 9);
				const pull = (r: number) => piece.area(r) * field.g(r);
				const size = integrate((r) => Math.abs(pull(r)), edges, 1e-11, 1e-15).value;
				const weight = integrate(pull, edges, 1e-13, 1e-13 * (size / (b - a))).value;
				expect(Math.abs(piece.weight(a, b) - weight)).toBeLessThan(1e-10 * size);
			}),
			{ numRuns: 60 }
		);
	});
});

describe('the limits of the field', () => {
	it('is that of a sphere as J2 goes to zero', () => {
		fc.assert(
			fc.property(decades(3, 8), between(1.05, 60), between(1, 5), (radius, ratio, r) => {
				const gm = 1.4e-6 * radius ** 3;
				const body = { gm, radius, rate: Math.sqrt(gm / (radius * ratio) ** 3) };
				const sphere = bodyField({ ...body, j2: 0 });
				for (const j2 of [1e-4, 1e-8, 1e-12]) {
					const oblate = bodyField({ ...body, j2 });
					// At most 3/2 J2 of gravity at the surface.
					const most = (1.5 * j2 + 1e-14) * (gm / radius ** 2);
					expect(Math.abs(oblate.g(r * radius) - sphere.g(r * radius))).toBeLessThan(most);
					expect(Math.abs(oblate.balance / sphere.balance - 1)).toBeLessThan(j2 + 1e-14);
				}
			})
		);
	});

	it('of a moon is that of one body as its primary loses its mass, the rate held by the distance', () => {
		fc.assert(
			fc.property(
				fc.constantFrom('near' as const, 'far' as const),
				decades(-12, -4),
				between(0.1, 0.8),
				(side, share, at) => {
					const [moonGm, moonRadius, rate] = [5e12, 1e6, 1e-4];
					const primaryGm = share * moonGm;
					const distance = Math.cbrt((moonGm + primaryGm) / rate ** 2);
					const line = moonField({ moonGm, primaryGm, moonRadius, distance }, side);
					const body = bodyField({ gm: moonGm, radius: moonRadius, rate, j2: 0 });
					const r = at * distance;
					expect(Math.abs(line.g(r) / body.g(r) - 1)).toBeLessThan(50 * share + 1e-12);
					expect(line.outOfPlane(r) / body.outOfPlane(r) - 1).toBeLessThan(200 * share);
					// The near side ends at the primary, which stands where the balance is.
					if (side === 'far')
						expect(Math.abs(line.balance / body.balance - 1)).toBeLessThan(share + 1e-12);
				}
			)
		);
	});
});
