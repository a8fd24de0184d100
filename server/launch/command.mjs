/**
 * Runs a built program: on the services that the environment names, or, where it names none, on those
 * of `npm start` in this folder, which must be running.
 */
import { existsSync, readFileSync } from 'node:fs';

const DEMO = '.data/environment.json';
const [, , program, ...words] = process.argv;

if (!process.env.DATABASE_URL && existsSync(DEMO))
	Object.assign(process.env, JSON.parse(readFileSync(DEMO, 'utf8')));
process.argv = [process.argv[0], program, ...words];
await import(new URL(`../../build/${program}.js`, import.meta.url).href);
