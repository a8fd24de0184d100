/**
 * `npm run verify-baseline -- <id, or CL-DN-004/B>`: recomputes a baseline and says whether it holds.
 * Ends with 0 when it holds, 1 when it does not, 2 when it could not be verified.
 */
import { eq, and } from 'drizzle-orm';
import { db, pool } from '$lib/server/db';
import { baseline, note } from '$lib/server/db/schema';
import { verificationLines } from '$lib/server/baselines/report';
import { verifyBaseline } from '$lib/server/baselines/verify';
import { isUuid } from '$lib/server/auth/guard';
import { closeEngine } from '$lib/server/engine/evaluate';
import { settings } from '$lib/server/settings';

async function find(which: string) {
	if (isUuid(which)) return db.select().from(baseline).where(eq(baseline.id, which));
	const [number = '', revision = ''] = which.split('/');
	const rows = await db
		.select({ baseline })
		.from(baseline)
		.innerJoin(note, eq(note.id, baseline.noteId))
		.where(and(eq(note.number, number), eq(baseline.revision, revision)));
	return rows.map((row) => row.baseline);
}

async function main(which: string | undefined): Promise<number> {
	if (!which) {
		console.error('Which baseline? Give its id, or note and revision as in CL-DN-004/B.');
		return 2;
	}
	settings();
	const [row, another] = await find(which);
	if (!row || another) {
		console.error(`${row ? 'More than one baseline is' : 'There is no baseline'} ${which}.`);
		return 2;
	}
	const verification = await verifyBaseline(row);
	for (const line of verificationLines(which, verification)) console.log(line);
	return verification.holds ? 0 : 1;
}

try {
	process.exitCode = await main(process.argv[2]);
} catch (error) {
	// A failed query names its reason as its cause.
	const { message, cause } = error as Error;
	const reason = cause instanceof Error ? cause.message || String(cause) : message;
	console.error(`${process.argv[2]} could not be verified: ${reason}`);
	process.exitCode = 2;
} finally {
	await closeEngine();
	await pool.end();
}
