import { readFileSync, readdirSync } from 'node:fs';
import { dirname, join, relative, resolve } from 'node:path';
import { describe, expect, it } from 'vitest';

const engine = import.meta.dirname;
const sources = readdirSync(engine, { recursive: true, encoding: 'utf8' })
	.filter((name) => name.endsWith('.ts') && !name.endsWith('.spec.ts'))
	.map((name) => join(engine, name));

const imported = (file: string) =>
	[...readFileSync(file, 'utf8').matchAll(/(?:from|import)\s*\(?\s*'([^'\n]+)'/g)].map(
		([, path]) => path!
	);

/** The Sun's longitude by date: in one place, which no page's script reaches. */
const EPHEMERIS: Record<string, string> = { 'release/sun-longitude.ts': 'astronomy-engine' };

describe('the engine', () => {
	it('imports nothing outside itself but mathjs and one ephemeris', () => {
		expect(sources.length).toBeGreaterThan(20);
		for (const file of sources) {
			for (const path of imported(file)) {
				const inside =
					path.startsWith('.') && resolve(dirname(file), path).startsWith(engine + '/');
				const name = relative(engine, file);
				const allowed = path.startsWith('mathjs/') || path === EPHEMERIS[name];
				expect(inside || allowed, `${name}: ${path}`).toBe(true);
			}
		}
	});

	it('needs mathjs in one place only, so that pages can use the rest without it', () => {
		const using = sources.filter((file) =>
			imported(file).some((path) => path.startsWith('mathjs'))
		);
		expect(using.map((file) => relative(engine, file))).toEqual(['calc/grammar.ts']);
	});
});
