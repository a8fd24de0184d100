/** The engine on the command line, as anybody runs it in a clone. */
import { spawnSync } from 'node:child_process';
import { expect, test } from 'vitest';

function command(words: string[], input = '') {
	const env = { ...process.env };
	delete env.DATABASE_URL;
	const done = spawnSync('npm', ['run', '-s', ...words], { input, encoding: 'utf8', env });
	return { code: done.status, out: done.stdout, said: done.stderr };
}

const steel = { site: { kind: 'body', body: 'earth' }, density: 7900, stress: 5e9 };

test('a method answers JSON in SI and ends with 0', () => {
	const { code, out, said } = command(['method', '--', 'uniform-line', '-'], JSON.stringify(steel));
	expect([code, said]).toEqual([0, '']);
	// σ/(ρ g₀), by hand.
	expect(JSON.parse(out).outputs.breakingLength).toBeCloseTo(5e9 / (7900 * 9.80665), 6);
});

test('a refusal is said in words, written as a problem, and ends with 2', () => {
	const wrong = JSON.stringify({ ...steel, density: -1 });
	const { code, out, said } = command(['method', '--', 'uniform-line', '-'], wrong);
	expect(code).toBe(2);
	expect(said).toContain('density must be above 0');
	expect(JSON.parse(out)).toMatchObject({
		status: 422,
		code: 'input',
		faults: [{ path: 'density' }]
	});
});

test.each([
	[['method'], 'Name a method'],
	[['method', '--', 'uniform-lin', '-'], 'uniform-line'],
	[['method', '--', 'uniform-line', 'nowhere.json'], 'nowhere.json cannot be read'],
	[['evaluate'], 'Name a JSON file'],
	[['evaluate', '--', '-'], 'is not JSON']
])('%j is told what is wrong with it', (words, wanted) => {
	const { code, said } = command(words, '{');
	expect(code).toBe(2);
	expect(said).toContain(wanted);
});

test.each([
	['method', '['.repeat(100_000) + ']'.repeat(100_000), 'nested more than 200 levels deep'],
	['method', '{"density": NaN}', 'is not JSON'],
	['method', '{"density": "NaN", "colour": 1}', 'density must be a number'],
	['evaluate', '{"format":"holdfast-note","version":2}', 'known here is 1'],
	['evaluate', '[]', 'The whole: ']
])('%s on hostile input is told in words, with a problem for a program', (name, input, wanted) => {
	const words = name === 'method' ? [name, '--', 'uniform-line', '-'] : [name, '--', '-'];
	const { code, out, said } = command(words, input);
	expect(code).toBe(2);
	expect(said).toContain(wanted);
	expect(said).not.toMatch(/\n\s+at /);
	expect(JSON.parse(out)).toMatchObject({ type: 'about:blank', status: 422 });
});

test('a note in interchange is evaluated without a database', () => {
	const note = {
		format: 'holdfast-note',
		version: 1,
		thinLimit: '',
		items: [
			{
				...{ id: 'a', kind: 'calculation', symbol: 'x', description: '' },
				...{ expression: '2 km + 500 m', unit: 'm', digits: '' }
			}
		]
	};
	const { code, out } = command(['evaluate', '--', '-'], JSON.stringify(note));
	expect(code).toBe(0);
	expect(JSON.parse(out).results[0].outcome.quantity.value).toBe(2500);
});
