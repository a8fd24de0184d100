import { describe, expect, it } from 'vitest';
import { elongation, lengthOf } from './elongation';
import { BODY, TOP, lineWith, stepped, taper } from './lines.fixture';
import { hang } from './tension';

const stretch = (line: ReturnType<typeof lineWith>, modulus: number, thermalStrain = 0) =>
	elongation(line, hang(line), { modulus, thermalStrain });

describe('the stretch of a line', () => {
	const bare = lineWith(taper(), 0);
	const counterweight = (50e9 * bare.pieces.at(-1)!.area(TOP)) / -bare.field.g(TOP);
	const line = lineWith(taper(), counterweight);

	it('is L ε/(1 + ε) for the exact taper', () => {
		expect(stretch(line, 1e12) / ((lengthOf(line) * 0.05) / 1.05)).toBeCloseTo(1, 10);
	});

	it('adds the strain of a change of temperature', () => {
		const strain = 0.05 + 1e-3;
		expect(stretch(line, 1e12, 1e-3) / ((lengthOf(line) * strain) / (1 + strain))).toBeCloseTo(
			1,
			10
		);
	});

	it('is the mean strain where the strain is small', () => {
		const uniform = lineWith(stepped([1e-6]), 1e6);
		const { stretches } = hang(uniform);
		// ∫σ dr of a uniform line, by Simpson’s rule.
		const sigma = (r: number) =>
			(stretches.at(-1)!.upper - 1300e-6 * uniform.field.rise(r, TOP)) / 1e-6;
		const n = 20_000;
		const step = (TOP - BODY.radius) / n;
		let sum = 0;
		for (let i = 0; i <= n; i += 1)
			sum += (i === 0 || i === n ? 1 : i % 2 === 1 ? 4 : 2) * sigma(BODY.radius + i * step);
		expect((stretch(uniform, 1e20) * 1e20) / ((sum * step) / 3)).toBeCloseTo(1, 7);
	});

	it('is refused where the strain comes to −100 %', () => {
		expect(() => stretch(line, 1e12, -2)).toThrow('no length as manufactured');
	});
});
