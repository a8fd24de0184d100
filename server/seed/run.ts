/** Writes the demo programmes into an empty database; `npm start` runs it once. */
import { pool } from '$lib/server/db';
import { closeEngine } from '$lib/server/engine/evaluate';
import { seed } from './index';

await seed();
await closeEngine();
await pool.end();
