/**
 * The engine against SciPy on case D1, in one run: SciPy is called once and timed inside its process
 * (scipy_times.py, monte_carlo.py). Both must come to the same figures. Needs python3 with SciPy (Debian: python3-scipy).
 */
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { METHODS } from '../../src/lib/engine/methods/catalogue';
import { answer } from '../../src/lib/engine/methods/method';
import { analyse } from '../../src/lib/engine/line/as-built';
import { lineOf, type LineInput } from '../../src/lib/engine/line/line';
import { fieldOf, type Site } from '../../src/lib/engine/line/site';
import { sizeTaper } from '../../src/lib/engine/line/taper';
import { hang } from '../../src/lib/engine/line/tension';
import { uncoupledModes } from '../../src/lib/engine/motion/periods';

type Timed<F> = { seconds: number; figures: F };
type Sampled = Timed<Record<'taper' | 'mass' | 'counterweight', { mean: number; u: number }>> & {
	samples: number;
};
type Scipy = {
	sizing: Timed<{ mass: number; counterweight: number }>;
	asBuilt: Timed<{ anchorTension: number; points: number }>;
	periods: Timed<Record<'inPlane' | 'outOfPlane' | 'along', number[]>>;
};

function timesOf<T>(script: string): T {
	const path = fileURLToPath(new URL(script, import.meta.url));
	const { stdout, stderr, status } = spawnSync('python3', [path], { encoding: 'utf8' });
	if (status !== 0) throw new Error(`SciPy could not be timed (Debian: python3-scipy): ${stderr}`);
	return JSON.parse(stdout) as T;
}

const scipy = timesOf<Scipy>('scipy_times.py');
const sampled = timesOf<Sampled>('monte_carlo.py');

const earth: Site = { kind: 'body', body: 'earth', j2: false };
const field = fieldOf(earth);
const top = field.base + 1e8;
const sizing = () =>
	sizeTaper(field, {
		density: 1300,
		designStress: 50e9,
		base: { lift: 20e3 },
		reserve: 0,
		top
	});
const sized = sizing();
const input: LineInput = {
	site: earth,
	density: 1300,
	section: { kind: 'taper', baseArea: sized.baseArea, designStress: 50e9, top },
	masses: [],
	counterweight: Number(sized.counterweight)
};
const climbers = [1.2e6, 9.1e6, 2.4e7].map((height) => ({
	radius: field.base + height,
	mass: 12e3
}));
const laden = lineOf({ ...input, masses: climbers });
const line = lineOf(input);
const asBuilt = () => analyse(laden, 50e9, 2000);
const periods = () => uncoupledModes(line, hang(line), 2, 1e12);

/** The study of monte_carlo.py, by the methods as anybody calls them. */
const study = {
	method: 'taper',
	input: {
		site: { kind: 'body', body: 'earth' },
		...{ density: 1300, allowable: 50e9, factorOfSafety: 1, top },
		base: { kind: 'lift', lift: 20e3 }
	},
	uncertain: [
		{ path: 'density', distribution: { kind: 'normal', mean: 1300, u: 20 } },
		{ path: 'allowable', distribution: { kind: 'lognormal', mean: 50e9, u: 3e9 } },
		{ path: 'base.lift', distribution: { kind: 'uniform', low: 19e3, high: 21e3 } }
	],
	outputs: ['taper', 'lineMass', 'counterweight'],
	samples: sampled.samples
};
type Studied = { outputs: { mean: number; u: number; meanError: number }[] };
function monteCarlo(): Studied {
	const found = answer(METHODS.get('monte-carlo')!, study);
	if (!found.ok) throw new Error(found.refusal.message);
	return found.outputs as Studied;
}

/** Median time of one run, s, after as many again to warm up. */
function timed(run: () => unknown, rounds: number): number {
	const times: number[] = [];
	for (let n = 0; n < 2 * rounds; n += 1) {
		const start = performance.now();
		run();
		if (n >= rounds) times.push(performance.now() - start);
	}
	return times.sort((a, b) => a - b)[rounds >> 1]! / 1e3;
}

function mustAgree(what: string, got: number, wanted: number, within: number): void {
	if (!(Math.abs(got / wanted - 1) <= within))
		throw new Error(`${what}: ${got} here, ${wanted} with SciPy.`);
}

mustAgree('line mass', Number(sized.mass), scipy.sizing.figures.mass, 1e-8);
const { anchorTension } = asBuilt().extremes;
mustAgree('anchor tension', anchorTension, scipy.asBuilt.figures.anchorTension, 1e-6);
for (const [kind, hours] of Object.entries(scipy.periods.figures))
	hours.forEach((wanted, i) => {
		const mode = periods()[kind as keyof Scipy['periods']['figures']][i]!;
		mustAgree(`${kind} ${i + 1}`, mode.period! / 3600, wanted, 1e-6);
	});

Object.values(sampled.figures).forEach(({ mean, u }, i) => {
	const output = monteCarlo().outputs[i]!;
	// Two samples of their own: apart by chance only.
	mustAgree(`mean of ${study.outputs[i]}`, output.mean, mean, (8 * output.meanError) / mean);
	mustAgree(`u of ${study.outputs[i]}`, output.u, u, 0.03);
});

const rows: [what: string, ours: number, theirs: number, target: string][] = [
	['sizing of D1', timed(sizing, 3000), scipy.sizing.seconds, 'at most 5'],
	['as built, 3 climbers, 2 000 points', timed(asBuilt, 60), scipy.asBuilt.seconds, 'below 1'],
	['six periods to 1e-6', timed(periods, 200), scipy.periods.seconds, 'at most 5'],
	['Monte Carlo, 100 000 samples', timed(monteCarlo, 2), sampled.seconds, 'at most 5']
];
const ms = (seconds: number) => `${(seconds * 1e3).toPrecision(3)} ms`.padStart(12);
for (const [what, ours, theirs, target] of rows)
	console.log(
		`${what.padEnd(36)}${ms(ours)}${ms(theirs)} SciPy   ratio ${(ours / theirs).toPrecision(3)} (${target})`
	);
