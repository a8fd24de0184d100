/** A method that a study has prepared answers as it does when it is called anew for each sample. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { METHODS } from './catalogue';
import { answer, type AnyMethod } from './method';
import { outputAt, outputPath, inputPath } from './value-path';
import { outputsWith, subjectOf } from './study';
import { Refused } from './refused';

const PREPARED = [...METHODS.values()].filter(({ prepare }: AnyMethod) => prepare);

const log = (least: number, most: number) =>
	fc.double({ min: Math.log(least), max: Math.log(most), noNaN: true }).map((ln) => Math.exp(ln));

const site = fc.constantFrom(
	{ kind: 'body', body: 'earth' },
	{ kind: 'body', body: 'earth', j2: true },
	{ kind: 'body', body: 'ceres' },
	{ kind: 'own', gm: 4.2e13, radius: 3.4e6, rate: 7e-5, j2: 1e-3 },
	{ kind: 'moon', side: 'near' },
	{ kind: 'moon', side: 'far' }
);

/** What varies from sample to sample, and how far: also beyond what the method takes. */
const VARYING = {
	density: log(1e2, 1e4),
	allowable: log(1e8, 1e12),
	factorOfSafety: log(0.5, 5),
	'base.lift': log(1, 1e9),
	reserve: fc.double({ min: -0.1, max: 1, noNaN: true }),
	top: log(1e6, 1e10),
	rangeTop: log(1e6, 1e10)
};
type Name = keyof typeof VARYING;
const names = Object.keys(VARYING) as Name[];
const sample = fc.record(VARYING);

/** An output, or why there is none. */
function read(find: () => unknown): unknown {
	try {
		return find();
	} catch (error) {
		if (!(error instanceof Refused)) throw error;
		return error.refusal;
	}
}

it('a place that varies is another place for each sample', () => {
	const method = METHODS.get('taper')!;
	const input = (rate: number) => ({
		site: { kind: 'own', gm: 4.2e13, radius: 3.4e6, rate },
		...{ density: 1500, allowable: 4e10, factorOfSafety: 2, top: 1e8 },
		base: { kind: 'lift', lift: 1e3 }
	});
	const subject = subjectOf(METHODS, { method: 'taper', input: input(7e-5) });
	const outputsAt = outputsWith(subject, [
		inputPath(method.inputs, subject.values, 'site.rate', 'uncertain')
	]);
	const path = outputPath(method.outputs, 'balanceRadius', 'outputs');
	for (const rate of [7e-5, 8e-5, 6e-5]) {
		// r_s = (GM/ω²)^⅓, where gravity and the turn of the body balance.
		expect(outputAt(outputsAt([rate]), path)).toBeCloseTo(Math.cbrt(4.2e13 / rate ** 2), 6);
	}
});

describe.each(PREPARED.map((method) => [method.name, method] as const))('%s', (name, method) => {
	const outputs = Object.keys(method.outputs).filter((output) => output !== 'trade');

	it('is the same prepared for samples and called anew for each', () => {
		let found = 0;
		fc.assert(
			fc.property(
				site,
				fc.subarray(names, { minLength: 1 }),
				sample,
				fc.array(sample, { minLength: 1, maxLength: 4 }),
				(where, varying, fixed, samples) => {
					const inputWith = (values: typeof fixed) => ({
						site: where,
						density: values.density,
						allowable: values.allowable,
						factorOfSafety: values.factorOfSafety,
						base: { kind: 'lift', lift: values['base.lift'] },
						reserve: values.reserve,
						top: values.top,
						rangeTop: values.rangeTop
					});
					const subject = subjectOf(METHODS, {
						method: name,
						input: inputWith({ ...fixed, reserve: 0.1 })
					});
					const paths = varying.map((path) =>
						inputPath(method.inputs, subject.values, path, 'uncertain')
					);
					const prepared = outputsWith(subject, paths);
					for (const values of samples) {
						const varied = Object.fromEntries(varying.map((path) => [path, values[path]]));
						const now = { ...fixed, reserve: 0.1, ...varied };
						const called = answer(method, inputWith(now));
						const x = varying.map((path) => values[path]);
						if (!called.ok) {
							const refused = read(() => prepared(x));
							expect(refused).toMatchObject({ message: called.refusal.message });
							continue;
						}
						const ours = prepared(x);
						for (const output of outputs) {
							const path = outputPath(method.outputs, output, 'outputs');
							expect(outputAt(ours, path)).toEqual(outputAt(called.outputs, path));
							found += 1;
						}
					}
				}
			),
			{ numRuns: 300 }
		);
		expect(found).toBeGreaterThan(500);
	}, 60_000);
});
