/** Whether the migrations lead to the schema that the code describes. */
import { spawnSync } from 'node:child_process';
import { cpSync, mkdtempSync, rmSync } from 'node:fs';
import { relative } from 'node:path';

/** What drizzle-kit says when it would write another migration; null when there is none to write. */
export function schemaDrift(): string | null {
	const folder = mkdtempSync('test-results/drizzle-');
	try {
		cpSync('drizzle', folder, { recursive: true });
		const { stdout, stderr } = spawnSync(
			'node_modules/.bin/drizzle-kit',
			[
				...['generate', '--dialect', 'postgresql', '--name', 'drift'],
				...['--schema', 'src/lib/server/db/schema.ts', '--out', relative('.', folder)]
			],
			{ encoding: 'utf8', stdio: ['ignore', 'pipe', 'pipe'], timeout: 60_000 }
		);
		if (stdout.includes('No schema changes')) return null;
		const said = `The schema and the migrations differ:\n${stdout}${stderr}`;
		console.error(said);
		return said;
	} finally {
		rmSync(folder, { recursive: true, force: true });
	}
}
