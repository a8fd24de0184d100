/**
 * Sizing and as-built analysis of case D1 beside SciPy, in one run: SciPy is called once and timed inside
 * (scipy_times.py). Aimed at: at most five times SciPy's time for sizing, less than `solve_ivp` for as-built.
 */
import { spawnSync } from 'node:child_process';
import { bench, describe } from 'vitest';
import { analyse } from '../../src/lib/engine/line/as-built';
import { BODIES } from '../../src/lib/engine/line/bodies';
import { lineOf } from '../../src/lib/engine/line/line';
import { ofBody } from '../../src/lib/engine/line/site';
import { sizeTaper } from '../../src/lib/engine/line/taper';

const earth = ofBody(BODIES.earth, false);
const top = earth.base + 1e8;
const designStress = 50e9;
const size = () =>
	sizeTaper(earth, { density: 1300, designStress, base: { lift: 20e3 }, reserve: 0, top });

const sized = size();
const line = lineOf({
	site: { kind: 'body', body: 'earth', j2: false },
	density: 1300,
	section: { kind: 'taper', baseArea: sized.baseArea, designStress, top },
	masses: [1.2e6, 9.1e6, 2.4e7].map((height) => ({ radius: earth.base + height, mass: 12e3 })),
	counterweight: Number(sized.counterweight)
});
const asBuilt = () => analyse(line, designStress, 2000);

type Timed<F> = { seconds: number; figures: F };
type SciPy = {
	sizing: Timed<{ mass: number; counterweight: number }>;
	asBuilt: Timed<{ anchorTension: number }>;
};

function scipy(): SciPy | null {
	const { status, stdout } = spawnSync('python3', ['tests/bench/scipy_times.py'], {
		encoding: 'utf8'
	});
	return status === 0 ? (JSON.parse(stdout) as SciPy) : null;
}

/** Median time of one run, s. */
function median(run: () => unknown, rounds: number): number {
	const times = Array.from({ length: rounds }, () => {
		const start = performance.now();
		run();
		return (performance.now() - start) / 1e3;
	});
	return times.sort((a, b) => a - b)[rounds >> 1]!;
}

/** Both compute the same, or their times say nothing. */
function mustAgree(what: string, ours: number, theirs: number) {
	if (!(Math.abs(ours / theirs - 1) < 1e-6)) throw new Error(`They differ in ${what}.`);
}

const theirs = scipy();
if (theirs === null) {
	console.log('SciPy is not there (python3-scipy): nothing to compare with.');
} else {
	mustAgree('the mass of the line', Number(sized.mass), theirs.sizing.figures.mass);
	mustAgree(
		'the tension at the anchor',
		asBuilt().extremes.anchorTension,
		theirs.asBuilt.figures.anchorTension
	);
	for (const [what, run, { seconds }] of [
		['sizing', size, theirs.sizing],
		['as-built', asBuilt, theirs.asBuilt]
	] as const) {
		median(run, 200);
		const ours = median(run, 200);
		console.log(
			`D1 ${what}: ${(ours * 1e6).toFixed(0)} µs, SciPy ${(seconds * 1e6).toFixed(0)} µs, ratio ${(ours / seconds).toFixed(2)}`
		);
	}
}

describe('case D1', () => {
	bench('sizing', () => void size());
	bench('as-built, 3 climbers and 2 000 radii', () => void asBuilt());
});
