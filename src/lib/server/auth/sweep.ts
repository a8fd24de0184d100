/** Removes what has lapsed: sessions, and counts of tries. */
import { lt } from 'drizzle-orm';
import { db } from '../db';
import { rateLimit, session } from '../db/schema';
import { log } from '../log';

const HOUR = 3_600_000;

export async function sweep(): Promise<void> {
	await db.delete(session).where(lt(session.expiresAt, new Date()));
	await db.delete(rateLimit).where(lt(rateLimit.expire, Date.now()));
}

/** Sweeps every hour as long as the process runs; does not keep it running. */
export function startSweeping(): void {
	setInterval(
		() => sweep().catch((error) => log.warn({ error }, 'Lapsed sessions could not be removed')),
		HOUR
	).unref();
}
