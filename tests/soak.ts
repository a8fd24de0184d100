/**
 * Tries the properties on cases of many seeds: `npm run soak -- ROUNDS [PATH …]`. It stops at the first
 * failure and says the seed, which `PROPERTY_SEED` gives again.
 */
import { spawnSync } from 'node:child_process';
import { randomInt } from 'node:crypto';
import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';

const [rounds = '20', ...paths] = process.argv.slice(2);
const files = ['src', 'server'].flatMap((folder) =>
	readdirSync(folder, { recursive: true, encoding: 'utf8' }).map((file) => join(folder, file))
);
const specs = files.filter(
	(file) =>
		file.endsWith('.spec.ts') &&
		readFileSync(file, 'utf8').includes("'fast-check'") &&
		(paths.length === 0 || paths.some((path) => file.startsWith(path)))
);

for (let round = 1; round <= Number(rounds); round += 1) {
	const seed = randomInt(1, 2 ** 31);
	const { status, stdout, stderr } = spawnSync(
		'npx',
		['vitest', 'run', '--project', 'unit', ...specs],
		{
			env: { ...process.env, PROPERTY_SEED: String(seed) },
			encoding: 'utf8'
		}
	);
	if (status !== 0) {
		console.log(stdout, stderr);
		console.log(`PROPERTY_SEED=${seed} fails.`);
		process.exit(1);
	}
	console.log(`round ${round} of ${rounds}, seed ${seed}: ${specs.length} files hold`);
}
