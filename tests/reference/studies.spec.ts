/** Uncertainty, Monte Carlo, sweeps and budgets against the GUM, its supplement, and figures by hand. */
import { describe, expect, it } from 'vitest';
import { METHODS } from '$lib/engine/methods/catalogue';
import { answer } from '$lib/engine/methods/method';
import { quantile7 } from '$lib/engine/numerics/sample';
import { correlationMatrix } from '$lib/engine/studies/correlation';
import type { Distribution } from '$lib/engine/studies/distribution';
import type { Model } from '$lib/engine/studies/model';
import { momentsOf } from '$lib/engine/studies/moments';
import { startMonteCarlo } from '$lib/engine/studies/monte-carlo';
import { outputCorrelation, propagate } from '$lib/engine/studies/propagation';
import { secondOrderTerms } from '$lib/engine/studies/second-order';
import { slopesOf } from '$lib/engine/studies/slopes';

function outputs<T = Record<string, never>>(name: string, input: object): T {
	const found = answer(METHODS.get(name)!, input);
	if (!found.ok) throw new Error(found.refusal.message);
	return found.outputs as T;
}

describe('JCGM 100 (GUM), H.1: the length of an end gauge', () => {
	// l = l_s + d − l_s (δα θ + α_s δθ); table H.1, nm.
	const givens = [
		{ name: 'l_s', value: 50_000_623, u: 25 },
		{ name: 'd', value: 215, u: 9.7 },
		{ name: 'δα', value: 0, u: 0.58e-6 },
		{ name: 'θ', value: -0.1, u: 0.41 },
		{ name: 'α_s', value: 11.5e-6, u: 1.2e-6 },
		{ name: 'δθ', value: 0, u: 0.029 }
	];
	const gauge: Model = ([ls, d, da, th, as, dth], y) => {
		y[0] = ls! + d! - ls! * (da! * th! + as! * dth!);
	};
	const slopes = slopesOf(gauge, givens, 1);
	const u = Float64Array.from(givens, (given) => given.u);
	const names = givens.map(({ name }) => name);
	const first = propagate(
		slopes.map(([slope]) => slope!),
		u,
		correlationMatrix(names, [])
	);

	it('has 32 nm to the first order', () => expect(first.u).toBeCloseTo(31.7, 1));

	it('has 34 nm with the terms of second order', () => {
		const { variance } = secondOrderTerms(gauge, givens, slopes, 1);
		expect(Math.round(Math.sqrt(first.u ** 2 + variance[0]!))).toBe(34);
	});
});

describe('JCGM 100 (GUM), H.2: resistance and reactance measured together', () => {
	// The five sets of table H.2: V, mA, rad.
	const sets = {
		V: [5.007, 4.994, 5.005, 4.99, 4.999],
		I: [19.663e-3, 19.639e-3, 19.64e-3, 19.685e-3, 19.678e-3],
		φ: [1.0456, 1.0438, 1.0468, 1.0428, 1.0433]
	};
	const figures = Object.values(sets);
	const means = figures.map((set) => set.reduce((sum, x) => sum + x, 0) / 5);
	/** Covariance of two means, JCGM 100 5.2.3. */
	const covariance = (i: number, j: number) =>
		figures[i]!.reduce((sum, x, n) => sum + (x - means[i]!) * (figures[j]![n]! - means[j]!), 0) /
		20;
	const u = Float64Array.from(figures, (_, i) => Math.sqrt(covariance(i, i)));
	const givens = Object.keys(sets).map((name, i) => ({ name, value: means[i]!, u: u[i]! }));
	const pairs = [
		[0, 1],
		[0, 2],
		[1, 2]
	] as const;
	const r = correlationMatrix(
		Object.keys(sets),
		pairs.map(([first, second]) => ({
			first,
			second,
			r: covariance(first, second) / (u[first]! * u[second]!)
		}))
	);
	const impedance: Model = ([v, i, phi], y) => {
		y[0] = (v! / i!) * Math.cos(phi!);
		y[1] = (v! / i!) * Math.sin(phi!);
		y[2] = v! / i!;
	};
	const slopes = slopesOf(impedance, givens, 3);
	const found = [0, 1, 2].map((k) =>
		propagate(
			slopes.map((row) => row[k]!),
			u,
			r
		)
	);

	it('has the values and standard uncertainties of table H.3', () => {
		const y = new Float64Array(3);
		impedance(
			Float64Array.from(givens, ({ value }) => value),
			y
		);
		[127.732, 219.847, 254.26].forEach((value, k) => expect(y[k]).toBeCloseTo(value, 2));
		[0.071, 0.295, 0.236].forEach((value, k) =>
			expect(Math.abs(found[k]!.u - value)).toBeLessThanOrEqual(0.001)
		);
	});

	it('has its correlations', () => {
		const between = (i: number, k: number) => outputCorrelation(found[i]!, found[k]!, r);
		expect(Math.abs(between(0, 1) + 0.588)).toBeLessThanOrEqual(0.001);
		expect(Math.abs(between(0, 2) + 0.485)).toBeLessThanOrEqual(0.001);
		expect(Math.abs(between(1, 2) - 0.993)).toBeLessThanOrEqual(0.001);
	});
});

describe('JCGM 101, 9.2: a sum of four quantities', () => {
	const sum: Model = (x, y) => {
		y[0] = x.reduce((total, each) => total + each, 0);
	};
	const run = (distribution: Distribution, seed = 1) => {
		const givens = [1, 2, 3, 4].map((n) => ({ name: `X${n}`, distribution }));
		const study = startMonteCarlo({
			...{ givens, correlations: [], model: sum, outputs: 1, checks: [] },
			...{ samples: 200_000, seed }
		});
		study.run(200_000);
		return study.statistics(0);
	};

	it('of the standard normal has u = 2.00', () => {
		// 9.2.2; P5 and P95 at ± 1.645 × 2.
		const found = run({ kind: 'normal', mean: 0, u: 1 });
		expect(found.u).toBeCloseTo(2, 1);
		expect(Math.abs(found.u - 2)).toBeLessThan(0.015);
		expect(Math.abs(found.p95 - 3.29)).toBeLessThan(0.03);
	});

	it('of rectangular ones of the same u has u = 2.00 and lighter tails', () => {
		// 9.2.3.
		const half = Math.sqrt(3);
		const found = run({ kind: 'uniform', low: -half, high: half });
		expect(Math.abs(found.u - 2)).toBeLessThan(0.015);
		expect(found.greatest).toBeLessThanOrEqual(4 * half);
	});

	it('comes to the same figures for the same seed, and to others for another', () => {
		const one = run({ kind: 'normal', mean: 0, u: 1 }, 7);
		expect(run({ kind: 'normal', mean: 0, u: 1 }, 7)).toEqual(one);
		expect(run({ kind: 'normal', mean: 0, u: 1 }, 8).mean).not.toBe(one.mean);
	});
});

describe('distributions with bounds', () => {
	it('have the moments of the half normal where cut at their mean', () => {
		// √(2/π) and √(1 − 2/π), closed forms.
		const { mean, u } = momentsOf('x', { kind: 'normal', mean: 0, u: 1, least: 0 });
		expect(mean).toBeCloseTo(Math.sqrt(2 / Math.PI), 10);
		expect(u).toBeCloseTo(Math.sqrt(1 - 2 / Math.PI), 10);
	});

	it('are drawn within their bounds, not heaped on them', () => {
		const values: number[] = [];
		const study = startMonteCarlo({
			givens: [
				{ name: 'η', distribution: { kind: 'normal', mean: 0.98, u: 0.02, most: 1 } as const }
			],
			correlations: [],
			model: (x, y) => {
				values.push((y[0] = x[0]!));
			},
			...{ outputs: 1, checks: [], samples: 5000, seed: 3 }
		});
		study.run(5000);
		expect(Math.max(...values)).toBeLessThan(1);
		expect(new Set(values).size).toBe(5000);
	});
});

it('takes quantiles as NumPy does by default (type 7)', () => {
	// numpy.quantile([1, 2, 4, 8], [0.05, 0.5, 0.95])
	const ascending = [1, 2, 4, 8];
	expect(quantile7(ascending, 0.05)).toBeCloseTo(1.15, 12);
	expect(quantile7(ascending, 0.5)).toBeCloseTo(3, 12);
	expect(quantile7(ascending, 0.95)).toBeCloseTo(7.4, 12);
});

const D1 = {
	site: { kind: 'body', body: 'earth' },
	density: 1300,
	allowable: 100e9,
	factorOfSafety: 2,
	base: { kind: 'lift', lift: 20e3 },
	top: 106_378_137
};
const uncertain = [
	{ path: 'density', distribution: { kind: 'normal', mean: 1300, u: 13 } },
	{ path: 'allowable', distribution: { kind: 'normal', mean: 100e9, u: 1e9 } }
];

describe('studies of the taper of line D1', () => {
	type FirstOrder = { outputs: { value: number; u: number; inputs: { share: number }[] }[] };
	const study = { method: 'taper', input: D1, uncertain, outputs: ['taper'] };
	const linear = outputs<FirstOrder>('first-order', study).outputs[0]!;

	it('follow ln τ = ρ ΔU/σ_d to the first order', () => {
		// Both relative uncertainties are 1 %: u(τ)/τ = ln τ · √2 · 1 %, by hand with τ = 3.521 860.
		const tau = 3.52186;
		expect(linear.value).toBeCloseTo(tau, 5);
		expect(linear.u / (tau * Math.log(tau) * Math.SQRT2 * 0.01)).toBeCloseTo(1, 5);
		expect(linear.inputs.map(({ share }) => share)).toEqual([
			expect.closeTo(0.5, 5),
			expect.closeTo(0.5, 5)
		]);
	});

	it('agree with Monte Carlo within its standard error', () => {
		type MonteCarlo = {
			outputs: { mean: number; u: number; meanError: number }[];
			checks: { probability: number; standardError: number }[];
			resulted: number;
		};
		const found = outputs<MonteCarlo>('monte-carlo', {
			...study,
			samples: 20_000,
			seed: 11,
			checks: [
				{
					left: { kind: 'output', path: 'taper' },
					relation: 'le',
					right: { kind: 'value', value: linear.value }
				}
			]
		});
		expect(found.resulted).toBe(20_000);
		const [tau] = found.outputs;
		expect(Math.abs(tau!.u / linear.u - 1)).toBeLessThan(0.03);
		const [check] = found.checks;
		expect(Math.abs(check!.probability - 0.5)).toBeLessThan(4 * check!.standardError + 0.01);
	});

	it('count a sample that is refused, and say why', () => {
		type Refusing = { resulted: number; refused: { count: number; message: string }[] };
		const found = outputs<Refusing>('monte-carlo', {
			...study,
			uncertain: [
				{ path: 'top', distribution: { kind: 'uniform', low: 4e7, high: 5e7 } },
				{ path: 'density', distribution: { kind: 'normal', mean: 1300, u: 13 } }
			],
			samples: 1000
		});
		const lost = found.refused.reduce((sum, { count }) => sum + count, 0);
		expect(found.resulted + lost).toBe(1000);
		// Below 42 164 km nothing holds the line: about a fifth of the range.
		expect(lost).toBeGreaterThan(150);
		expect(lost).toBeLessThan(280);
	});

	it('sweep one given over a range', () => {
		type Swept = { points: { at: number[]; outputs: number[] }[] };
		const { points } = outputs<Swept>('sweep', {
			method: 'taper',
			input: D1,
			along: [{ path: 'factorOfSafety', from: 1, to: 3, count: 3 }],
			outputs: ['taper']
		});
		// τ = e^{c FS}: by hand from 3.521 860 at FS 2.
		const tau = (fs: number) => 3.52186 ** (fs / 2);
		points.forEach(({ at, outputs }) => expect(outputs[0]! / tau(at[0]!)).toBeCloseTo(1, 5));
	});

	it('refuse a matrix of correlations that no givens can have', () => {
		const found = answer(METHODS.get('first-order')!, {
			...study,
			uncertain: [...uncertain, { path: 'top', distribution: { kind: 'normal', u: 1e6 } }],
			correlations: [
				{ first: 'density', second: 'allowable', r: 0.9 },
				{ first: 'density', second: 'top', r: 0.9 },
				{ first: 'allowable', second: 'top', r: -0.9 }
			]
		});
		expect(found).toMatchObject({ ok: false });
	});
});

it('budgets masses: growth by maturity, system margin, what remains', () => {
	// By hand; 20, 10 and 5 % by maturity are common practice.
	const found = outputs<{ predicted: number; reserved: number; remaining: number }>('mass-budget', {
		rows: [
			{ item: 'climber', basic: 10_000, maturity: 'concept' },
			{ item: 'drive', basic: 2000, growth: 0.05 }
		],
		allowances: [{ maturity: 'concept', growth: 0.2 }],
		systemMargin: 0.2,
		allocation: 18_000
	});
	// 12 000 + 2 100 = 14 100; a fifth on top 2 820; 18 000 − 16 920 = 1 080.
	expect(found.predicted).toBeCloseTo(14_100, 8);
	expect(found.reserved).toBeCloseTo(16_920, 8);
	expect(found.remaining).toBeCloseTo(1080, 8);
});

it('gives a stress its margin of safety', () => {
	// allowed over actual less one, by hand.
	const found = outputs<{ margin: number; state: string }>('margin', {
		...{ relation: 'le', left: 50e9, right: 57.5e9, thinLimit: 0.2 }
	});
	expect(found.margin).toBeCloseTo(0.15, 12);
	expect(found.state).toBe('thin');
});

it('acts on no study', () => {
	const found = answer(METHODS.get('sweep')!, {
		method: 'sweep',
		input: {},
		along: [{ path: 'x', from: 0, to: 1 }],
		outputs: ['y']
	});
	expect(found).toMatchObject({ ok: false });
});
