/** Tells whether the build is of the sources as they are now. */
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

const STAMP = 'build/sources.sha256';
const FOLDERS = ['src', 'server', 'static'];
const FILES = [
	'package-lock.json',
	'svelte.config.js',
	'tailwind.config.ts',
	'tsconfig.json',
	'vite.config.ts'
];

export function buildIsCurrent(): boolean {
	return existsSync(STAMP) && readFileSync(STAMP, 'utf8') === digestOfSources();
}

/** Written last, so that a build that was broken off has none; `digest` was taken before it began. */
export function stampBuild(digest: string): void {
	writeFileSync(STAMP, digest);
}

export function digestOfSources(): string {
	const hash = createHash('sha256');
	const sources = FOLDERS.flatMap((folder) =>
		readdirSync(folder, { recursive: true, withFileTypes: true })
			.filter((entry) => entry.isFile() && !entry.name.endsWith('.spec.ts'))
			.map((entry) => join(entry.parentPath, entry.name))
	);
	for (const file of [...sources.sort(), ...FILES]) hash.update(file).update(readFileSync(file));
	return hash.digest('hex');
}
