/** `npm run migrate`: brings the database of DATABASE_URL to this version's schema. */
import { migrateDatabase } from './migrate';

const url = process.env.DATABASE_URL;
try {
	if (!url) throw new Error('DATABASE_URL is not set: the database to migrate.');
	await migrateDatabase(url);
	console.log('The database has the schema of this version.');
} catch (error) {
	console.error(error instanceof Error ? error.message : error);
	process.exitCode = 1;
}
