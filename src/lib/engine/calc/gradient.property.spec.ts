/** Slopes by reverse accumulation hold against central differences, for any expression. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compile } from './compile';
import { FUNCTIONS, functionNamed, type FunctionName } from './functions';
import { compileGradient } from './gradient';
import { parse } from './parse';

const NAMES = ['a', 'b', 'c'];
/** Of these no slope is to be had near a step or an upright tangent. */
const JUMPS: FunctionName[] = ['sign', 'floor', 'ceil', 'round'];
const FUNCTION_NAMES = (Object.keys(FUNCTIONS) as FunctionName[]).filter(
	// Of these no slope is to be had near a step or an upright tangent; a table takes lists.
	(name) => !JUMPS.includes(name) && name !== 'interpolate'
);

const { text } = fc.letrec<{ text: string }>((tie) => {
	const part = tie('text');
	return {
		text: fc.oneof(
			{ depthSize: 'small', withCrossShrink: true },
			fc.constantFrom(...NAMES, '2', '0.5', 'pi'),
			fc
				.tuple(part, fc.constantFrom(...'+-*/^'), part)
				.map(([left, sign, right]) => `(${left}) ${sign} (${right})`),
			part.map((of) => `-(${of})`),
			fc
				.tuple(fc.constantFrom(...FUNCTION_NAMES), fc.array(part, { minLength: 3, maxLength: 3 }))
				.map(([name, args]) => {
					const most = Math.min(functionNamed(name).takes[1], 3);
					return `${name}(${args.slice(0, most).join(', ')})`;
				}),
			fc
				.tuple(part, part, part, part)
				.map(([a, b, yes, no]) => `((${a}) < (${b}) ? (${yes}) : (${no}))`)
		)
	};
});
const figures = fc.array(fc.integer({ min: -300, max: 300 }), { minLength: 3, maxLength: 3 });

/** Null where there is no value at a point. */
function differences(run: (values: number[]) => number, at: number[], step: number) {
	try {
		return at.map((_, i) => {
			const moved = (by: number) => run(at.map((x, k) => (k === i ? x + by : x)));
			return (moved(step) - moved(-step)) / (2 * step);
		});
	} catch {
		return null;
	}
}

describe('the slopes of any expression', () => {
	it('are its central differences, where these have settled', () => {
		let held = 0;
		let upright = 0;
		fc.assert(
			fc.property(text, figures, (written, hundredths) => {
				const { expr } = parse(written);
				const run = compile(expr, NAMES);
				// No two alike: where a condition turns over at the very point, differences see the jump on both sides.
				const at = hundredths.map((figure, i) => figure / 100 + [0.003, 0.0051, 0.0079][i]!);
				const [coarse, fine] = [2e-4, 1e-4].map((step) => differences(run, at, step));
				fc.pre(Boolean(coarse && fine));
				const slopes = new Float64Array(3);
				compileGradient(expr, NAMES)(at, slopes);
				const size = Math.abs(run(at)) + 1;
				slopes.forEach((slope, i) => {
					const [rough, better] = [coarse![i]!, fine![i]!];
					const scale = size + Math.abs(better);
					// A corner or a pole between the points, or too steep for the step.
					if (!(Math.abs(rough - better) < 1e-6 * scale)) return;
					// √(a − a) is 0 however a is, but steeper than any slope on the way.
					if (!Number.isFinite(slope)) {
						upright += 1;
						return;
					}
					held += 1;
					expect(Math.abs(slope - better) / scale, `${written} at ${at}`).toBeLessThan(1e-5);
				});
			}),
			{ numRuns: 2000 }
		);
		expect(held).toBeGreaterThan(2000);
		expect(upright).toBeLessThan(held / 50);
	});
});
