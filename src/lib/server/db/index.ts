import { drizzle } from 'drizzle-orm/node-postgres';
import pg from 'pg';
import * as schema from './schema';

/** Connects on first use; that DATABASE_URL is set is checked when the process starts (`settings`). */
export const pool = new pg.Pool({ connectionString: process.env.DATABASE_URL, max: 20 });

// A backend that goes away while idle is replaced by the pool; it must not end the process.
pool.on('error', () => {});

export const db = drizzle(pool, { schema });

/** The database or a transaction on it: services take either. */
export type Db = typeof db | Parameters<Parameters<typeof db.transaction>[0]>[0];
