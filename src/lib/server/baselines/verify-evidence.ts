/** Evidence read back from the store and digested again. */
import { createHash } from 'node:crypto';
import { eq } from 'drizzle-orm';
import type { EvidenceDigest } from '$lib/note/frozen';
import { db } from '../db';
import { evidenceFile } from '../db/schema';
import { getObject } from '../evidence/store';
import { tally, type Tally } from './tally';

/** One file after the other: they may be large. A store that cannot be reached is no disagreement. */
export async function verifyEvidence(sealed: readonly EvidenceDigest[]): Promise<Tally> {
	const differ: string[] = [];
	for (const file of sealed) {
		const sha256 = await storedDigest(file);
		if (sha256 === null) differ.push(`${file.name} (not in the store)`);
		else if (sha256 !== file.sha256) differ.push(file.name);
	}
	return tally(sealed.length, differ);
}

async function storedDigest({ fileId, size }: EvidenceDigest): Promise<string | null> {
	const [row] = await db
		.select({ objectKey: evidenceFile.objectKey })
		.from(evidenceFile)
		.where(eq(evidenceFile.id, fileId));
	// Asks for one byte more than was sealed: a file that has grown digests otherwise.
	const bytes = row ? await getObject(row.objectKey, { first: 0, last: size }) : null;
	if (!bytes) return null;
	const hash = createHash('sha256');
	for await (const chunk of bytes) hash.update(chunk);
	return hash.digest('hex');
}
