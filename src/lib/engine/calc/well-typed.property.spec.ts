/** Expressions built so that their dimension is known never meet a dimension fault. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dimensionText, over, times, toPower, type Dimension } from '../quantities/dimension';
import { UNITS } from '../quantities/unit-table';
import { calculation, given, quantityOf } from './items.fixture';

const QUANTITIES = { L_1: 'km', m_1: 't', t_1: 'h', σ_1: 'GPa', n_1: '' };
const givens = Object.entries(QUANTITIES).map(([name, unit]) => given(name, '3', unit));
const dimensionOf = (unit: string): Dimension =>
	unit === '' ? UNITS.get('%')!.dimension : UNITS.get(unit)!.dimension;

type Typed = { text: string; dimension: Dimension };

const named: fc.Arbitrary<Typed> = fc
	.constantFrom(...Object.entries(QUANTITIES))
	.map(([name, unit]) => ({ text: name, dimension: dimensionOf(unit) }));
const literal: fc.Arbitrary<Typed> = fc
	.tuple(fc.integer({ min: 1, max: 99 }), fc.constantFrom('km', 't', 'min', 'ksi', 'N'))
	.map(([value, unit]) => ({ text: `${value} ${unit}`, dimension: dimensionOf(unit) }));

const madeOf = (leaf: fc.Arbitrary<Typed>) =>
	fc.letrec<{ expression: Typed }>((tie) => {
		const part = tie('expression');
		return {
			expression: fc.oneof(
				{ depthSize: 'small', withCrossShrink: true },
				leaf,
				fc.tuple(part, part).map(([a, b]) => ({
					text: `(${a.text}) * (${b.text})`,
					dimension: times(a.dimension, b.dimension)
				})),
				fc.tuple(part, part).map(([a, b]) => ({
					text: `(${a.text}) / (${b.text})`,
					dimension: over(a.dimension, b.dimension)
				})),
				part.map((a) => ({ text: `(${a.text}) + 2*(${a.text})`, dimension: a.dimension })),
				part.map((a) => ({ text: `max(0, ${a.text})`, dimension: a.dimension })),
				part.map((a) => ({ text: `sqrt(${a.text})`, dimension: toPower(a.dimension, 1 / 2) })),
				part.map((a) => ({ text: `(${a.text})^(2/3)`, dimension: toPower(a.dimension, 2 / 3) })),
				part.map((a) => ({ text: `(${a.text}) > 0 ? ${a.text} : 0`, dimension: a.dimension })),
				part.map((a) => ({ text: `mean([${a.text}, 2*(${a.text})])`, dimension: a.dimension })),
				part.map((a) => ({ text: `[0, ${a.text}][2]`, dimension: a.dimension }))
			)
		};
	}).expression;

/** Many runs on a busy machine take their time. */
const SECONDS = 60_000;

describe('a well-typed expression', () => {
	it(
		'has the dimension that its parts give it, and no dimension fault',
		() => {
			fc.assert(
				fc.property(madeOf(fc.oneof(named, literal)), ({ text, dimension }) => {
					fc.pre(text.length < 1500 && dimension.every((e) => Math.abs(e) < 20));
					const { outcome } = quantityOf([...givens, calculation('result', text)], 'result');
					if (outcome.state === 'fault') {
						expect(outcome.faults.map(({ code }) => code)).not.toContain('dimension');
					} else {
						expect(outcome).toMatchObject({ state: 'value' });
						if (outcome.state !== 'value') return;
						expect(dimensionText(outcome.quantity.dimension)).toBe(dimensionText(dimension));
					}
				}),
				{ numRuns: 200 }
			);
		},
		SECONDS
	);

	it(
		'scales as its dimension says when the base units are scaled',
		() => {
			// Powers of two, so that scaling rounds nothing.
			const factor = fc.integer({ min: -3, max: 3 }).map((power) => 2 ** power);
			const factors = fc.tuple(factor, factor, factor);
			fc.assert(
				fc.property(madeOf(named), factors, ({ text, dimension }, scale) => {
					fc.pre(text.length < 1500 && dimension.every((e) => Math.abs(e) < 10));
					const by = (of: Dimension) => scale.reduce((all, s, i) => all * s ** of[i]!, 1);
					const valueIn = (scaled: boolean) => {
						const items = Object.entries(QUANTITIES).map(([name, unit]) =>
							given(name, String(3 * (scaled ? by(dimensionOf(unit)) : 1)), unit)
						);
						const { outcome } = quantityOf([...items, calculation('result', text)], 'result');
						return outcome.state === 'value' ? outcome.quantity.si : null;
					};
					const [plain, scaled] = [valueIn(false), valueIn(true)];
					fc.pre(plain !== null && scaled !== null);
					expect(scaled! / plain! / by(dimension)).toBeCloseTo(1, 9);
				}),
				{ numRuns: 200 }
			);
		},
		SECONDS
	);
});
