/** Runs the steps named on the command line, or all, and says at the end what passed and failed. */
import { spawnSync } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import { schemaDrift } from './setup/schema-drift';

type Count = { passed: number; failed: number };

const VITEST = 'test-results/vitest.json';
const PLAYWRIGHT = 'test-results/playwright.json';

/** In the order in which they run: what is quick to fail first, and the build before what runs it. */
const STEPS: Record<string, () => Count> = {
	format: () => tool('prettier', ['--check', '--log-level', 'warn', '.']),
	lint: () => tool('eslint', ['.']),
	check: () => tool('svelte-check', ['--output', 'human', '--fail-on-warnings']),
	engine: () => tool('tsc', ['--noEmit', '-p', 'src/lib/engine/tsconfig.engine.json']),
	schema: () => one(schemaDrift() === null),
	build: () => tool('tsx', ['server/launch/build.ts']),
	tests: () =>
		counted(VITEST, 'vitest', [
			...['run', '--reporter=dot', '--reporter=json', `--outputFile.json=${VITEST}`]
		]),
	e2e: () => counted(PLAYWRIGHT, 'playwright', ['test'])
};

const one = (passes: boolean): Count => ({ passed: Number(passes), failed: Number(!passes) });

function run(program: string, args: string[]): boolean {
	const env = process.stdout.isTTY ? process.env : { ...process.env, NO_COLOR: '1' };
	const { status } = spawnSync(`node_modules/.bin/${program}`, args, { stdio: 'inherit', env });
	return status === 0;
}

const tool = (program: string, args: string[]) => one(run(program, args));

/** A runner's own numbers; when it fails without a failed test, that counts as one. */
function counted(report: string, program: string, args: string[]): Count {
	rmSync(report, { force: true });
	const passes = run(program, args);
	const count = read(report);
	return passes || count.failed > 0 ? count : { ...count, failed: 1 };
}

function read(report: string): Count {
	try {
		const result = JSON.parse(readFileSync(report, 'utf8'));
		return report === VITEST
			? { passed: result.numPassedTests, failed: result.numFailedTests }
			: { passed: result.stats.expected, failed: result.stats.unexpected + result.stats.flaky };
	} catch {
		return { passed: 0, failed: 1 };
	}
}

mkdirSync('test-results', { recursive: true });
const asked = process.argv.slice(2).filter((word) => word in STEPS);
const total: Count = { passed: 0, failed: 0 };
const table: string[] = [];
for (const name of asked.length > 0 ? asked : Object.keys(STEPS)) {
	console.log(`\n— ${name}`);
	const started = performance.now();
	const { passed, failed } = STEPS[name]!();
	total.passed += passed;
	total.failed += failed;
	const seconds = ((performance.now() - started) / 1000).toFixed(1);
	table.push(`${name.padEnd(8)} ${seconds.padStart(7)} s  ${passed} passed, ${failed} failed`);
}
console.log(`\n${table.join('\n')}\n\n${total.passed} passed, ${total.failed} failed`);
process.exitCode = total.failed > 0 ? 1 : 0;
