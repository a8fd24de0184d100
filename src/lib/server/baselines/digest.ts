/**
 * The digest of a baseline: SHA-256, in lower-case hexadecimal, over the UTF-8 bytes of five canonical
 * texts (`$lib/note/canonical`) in this order, each but the last followed by one line feed:
 *
 *     head        title block, gate, who froze it and when, update, engine version, counts
 *     content     every item as typed (`$lib/note/items`)
 *     results     what the engine computed from it
 *     evidence    file id, name, size and SHA-256 of each file the content names
 *     waivers     item and reason of each failing check that was let through
 *
 * The texts are stored as they are digested, so anybody can recompute the digest with `sha256sum`.
 */
import { createHash } from 'node:crypto';

export type SealedTexts = {
	head: string;
	content: string;
	results: string;
	evidence: string;
	waivers: string;
};

export function digestOf({ head, content, results, evidence, waivers }: SealedTexts): string {
	return createHash('sha256')
		.update([head, content, results, evidence, waivers].join('\n'), 'utf8')
		.digest('hex');
}
