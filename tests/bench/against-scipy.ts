/**
 * The engine against SciPy on case D1, in one run: SciPy is called once and timed inside its process
 * (scipy_times.py). Both must come to the same figures. Needs python3 with SciPy (Debian: python3-scipy).
 */
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { analyse } from '../../src/lib/engine/line/as-built';
import { lineOf, type LineInput } from '../../src/lib/engine/line/line';
import { fieldOf, type Site } from '../../src/lib/engine/line/site';
import { sizeTaper } from '../../src/lib/engine/line/taper';
import { hang } from '../../src/lib/engine/line/tension';
import { uncoupledModes } from '../../src/lib/engine/motion/periods';

type Timed<F> = { seconds: number; figures: F };
type Scipy = {
	sizing: Timed<{ mass: number; counterweight: number }>;
	asBuilt: Timed<{ anchorTension: number; points: number }>;
	periods: Timed<Record<'inPlane' | 'outOfPlane' | 'along', number[]>>;
};

const script = fileURLToPath(new URL('scipy_times.py', import.meta.url));
const { stdout, stderr, status } = spawnSync('python3', [script], { encoding: 'utf8' });
if (status !== 0) throw new Error(`SciPy could not be timed (Debian: python3-scipy): ${stderr}`);
const scipy = JSON.parse(stdout) as Scipy;

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

const rows: [what: string, ours: number, theirs: number, target: string][] = [
	['sizing of D1', timed(sizing, 3000), scipy.sizing.seconds, 'at most 5'],
	['as built, 3 climbers, 2 000 points', timed(asBuilt, 60), scipy.asBuilt.seconds, 'below 1'],
	['six periods to 1e-6', timed(periods, 200), scipy.periods.seconds, 'at most 5']
];
const ms = (seconds: number) => `${(seconds * 1e3).toPrecision(3)} ms`.padStart(12);
for (const [what, ours, theirs, target] of rows)
	console.log(
		`${what.padEnd(36)}${ms(ours)}${ms(theirs)} SciPy   ratio ${(ours / theirs).toPrecision(3)} (${target})`
	);
