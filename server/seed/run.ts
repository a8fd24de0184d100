/** Writes the demo programmes into the database of DATABASE_URL, which is empty. */
import { pool } from '../../src/lib/server/db';
import { seed } from './index';

await seed();
await pool.end();
process.exit(0);
