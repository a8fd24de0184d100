/**
 * Whether a baseline still is what was frozen: everything that can be recomputed is, from what stands
 * before it, and held against what is stored.
 *
 *     state    → content     the document is projected again
 *     content  → results     the engine of today computes again, figure by figure at 12 digits
 *     store    → evidence    each file is read back and digested
 *     head     → columns     what the register shows is what was sealed
 *     texts    → digest
 */
import { ENGINE_VERSION } from '$lib/engine/version';
import { canonicalJson } from '$lib/note/canonical';
import type { baseline } from '../db/schema';
import { digestOf } from './digest';
import { opened, type Baseline } from './read';
import { UNREADABLE, type Tally } from './tally';
import { verifyContent, verifyHead } from './verify-content';
import { verifyEvidence } from './verify-evidence';
import { verifyQuantities, type QuantityTally } from './verify-quantities';

type Row = typeof baseline.$inferSelect;

export type Verification = {
	holds: boolean;
	/** ISO moment at which it was done. */
	at: string;
	milliseconds: number;
	quantities: QuantityTally;
	text: Tally;
	evidence: Tally;
	titleBlock: Tally;
	digest: { agrees: boolean; stored: string; computed: string };
	engine: { frozenWith: string; now: string };
};

/** @throws when the engine or the store cannot be reached: that says nothing about the baseline. */
export async function verifyBaseline(row: Row): Promise<Verification> {
	const started = performance.now();
	const sealed = readable(row);
	const parts = {
		quantities: sealed
			? await verifyQuantities(sealed.content, sealed.results, row.engineVersion)
			: { ...UNREADABLE, kinds: { givens: 0, calculations: 0, outputs: 0, checks: 0 } },
		text: sealed ? verifyContent(row.state, sealed.content) : UNREADABLE,
		evidence: await verifyEvidence(row.evidence),
		titleBlock: sealed ? verifyHead(row, sealed.head) : UNREADABLE
	};
	const computed = digestOf({
		head: row.head,
		content: row.content,
		results: row.results,
		evidence: canonicalJson(row.evidence),
		waivers: canonicalJson(row.waivers)
	});
	const agrees = computed === row.digest;
	return {
		holds: agrees && Object.values(parts).every(({ agree, of }) => agree === of),
		at: new Date().toISOString(),
		milliseconds: Math.round(performance.now() - started),
		...parts,
		digest: { agrees, stored: row.digest, computed },
		engine: { frozenWith: row.engineVersion, now: ENGINE_VERSION }
	};
}

/** Null when the stored texts are no longer what this program writes. */
function readable(row: Row): Baseline | null {
	try {
		return opened(row);
	} catch {
		return null;
	}
}
