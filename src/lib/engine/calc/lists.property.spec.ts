/** Lists say what their values say alone. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calculation, given, resultsOf } from './items.fixture';
import type { ItemResult } from './results';

const figure = fc.integer({ min: 1, max: 400 }).map((hundredths) => hundredths / 100);
const row = fc.array(figure, { minLength: 2, maxLength: 6 });

/** Of one value x and a list y, always with a value for figures above 0. */
const { text } = fc.letrec<{ text: string }>((tie) => {
	const part = tie('text');
	return {
		text: fc.oneof(
			{ depthSize: 'small', withCrossShrink: true },
			fc.constantFrom('x', 'y', '2', '0.5'),
			fc
				.tuple(part, fc.constantFrom('+', '-', '*'), part)
				.map(([a, sign, b]) => `(${a}) ${sign} (${b})`),
			part.map((of) => `-(${of})`),
			part.map((of) => `atan(${of})`),
			part.map((of) => `abs(${of})`),
			fc.tuple(part, part).map(([a, b]) => `hypot(${a}, ${b}, 1)`),
			fc.tuple(part, part).map(([a, b]) => `(x > 1 ? ${a} + 0*y : ${b} + 0*y)`)
		)
	};
});

type Told = { si: number; u: number | null };

function toldOf(result: ItemResult | undefined, at: number): Told {
	if (result?.kind !== 'calculation') throw new Error('No calculation.');
	const { outcome } = result;
	if (outcome.state === 'value')
		return { si: outcome.quantity.si, u: outcome.quantity.uncertainty };
	if (outcome.state !== 'list') throw new Error(JSON.stringify(outcome));
	return { si: outcome.list.si[at]!, u: outcome.list.uncertainties?.[at] ?? null };
}

const near = (a: number, b: number) => Math.abs(a - b) <= 1e-12 * (1 + Math.abs(a) + Math.abs(b));

describe('each value of a list', () => {
	it('is what the expression gives for its place alone, with the same standard uncertainty', () => {
		fc.assert(
			fc.property(text, figure, row, (part, x, values) => {
				const written = `y + ${part}`;
				const ys = values.map((value, i) => given(`y_${i}`, String(value), '', '0.01'));
				const alone = ys.map(({ symbol }) =>
					calculation(`of_${symbol}`, written.replaceAll(/\by\b/g, symbol))
				);
				const results = resultsOf([
					given('x', String(x), '', '0.02'),
					...ys,
					calculation('y', `[${ys.map(({ symbol }) => symbol).join(', ')}]`),
					calculation('all', written),
					...alone
				]);
				alone.forEach(({ id }, i) => {
					const [one, among] = [toldOf(results.get(id), 0), toldOf(results.get('all'), i)];
					expect(near(one.si, among.si), written).toBe(true);
					expect(near(one.u ?? 0, among.u ?? 0), `${written}: ${one.u}, ${among.u}`).toBe(true);
				});
			}),
			{ numRuns: 300 }
		);
	}, 60_000);
});

describe('what a list comes to', () => {
	it.each(['sum', 'mean', 'min', 'max', 'std', 'count'])(
		'by %s is what its values come to written out, and does not hang on their order',
		(name) => {
			fc.assert(
				fc.property(row, (values) => {
					const ys = values.map((value, i) => given(`y_${i}`, String(value), '', '0.01'));
					const symbols = ys.map(({ symbol }) => symbol);
					const results = resultsOf([
						...ys,
						calculation('y', `[${symbols.join(', ')}]`),
						calculation('listed', `${name}(y)`),
						calculation('written', `${name}(${symbols.join(', ')})`),
						calculation('turned', `${name}([${symbols.toReversed().join(', ')}])`)
					]);
					const [listed, ...others] = ['listed', 'written', 'turned'].map((id) =>
						toldOf(results.get(id), 0)
					);
					for (const other of others) {
						expect(near(listed!.si, other.si)).toBe(true);
						expect(near(listed!.u ?? 0, other.u ?? 0)).toBe(true);
					}
				}),
				{ numRuns: 60 }
			);
		},
		60_000
	);
});
