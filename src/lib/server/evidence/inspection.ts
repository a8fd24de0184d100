/** Passes a file through to the store and learns on the way what is recorded of it. */
import { createHash } from 'node:crypto';
import { Problem } from '../problems';
import { HEAD, recogniseKind, UNKNOWN, type Kind } from './media-type';

export type Findings = { mediaType: string; size: number; sha256: string };

export type Inspection = {
	/** Fails when the file is too large, empty or a program; nothing may be kept of it then. */
	bytes: AsyncGenerator<Uint8Array>;
	/** Why the bytes were stopped; whoever takes them may fail with something that follows from it. */
	refusal(): Problem | undefined;
	/** Once all bytes have passed. */
	findings(): Findings;
};

export function inspect(
	source: AsyncIterable<Uint8Array>,
	name: string,
	maxMb: number
): Inspection {
	const hash = createHash('sha256');
	const utf8 = new TextDecoder('utf-8', { fatal: true });
	let kind: Kind | undefined;
	let isText = true;
	let size = 0;
	let refusal: Problem | undefined;

	function note(chunk: Uint8Array): Uint8Array {
		hash.update(chunk);
		if (kind!.mustBeText && isText) isText = !chunk.includes(0) && decodes(utf8, chunk);
		return chunk;
	}

	async function recognise(head: Uint8Array): Promise<void> {
		try {
			kind = await recogniseKind(head, name);
		} catch (error) {
			refusal = error as Problem;
		}
	}

	async function* pass(): AsyncGenerator<Uint8Array> {
		let head: Uint8Array[] | null = [];
		for await (const chunk of source) {
			size += chunk.length;
			if (size > maxMb * 1024 * 1024) throw (refusal = tooLarge(name, maxMb));
			// The rest of what is refused is still read: a browser hears the answer only when it has sent all.
			if (refusal) continue;
			if (!head) {
				yield note(chunk);
				continue;
			}
			head.push(chunk);
			if (size < HEAD) continue;
			const first = Buffer.concat(head);
			head = null;
			await recognise(first);
			if (!refusal) yield note(first);
		}
		if (head) {
			const whole = Buffer.concat(head);
			if (size === 0) refusal = new Problem(422, `${name} is empty.`);
			else await recognise(whole);
			if (!refusal) yield note(whole);
		}
		if (refusal) throw refusal;
	}

	return {
		bytes: pass(),
		refusal: () => refusal,
		findings() {
			const textAfterAll = isText && decodes(utf8);
			const mediaType = kind!.mustBeText && !textAfterAll ? UNKNOWN : kind!.mediaType;
			return { mediaType, size, sha256: hash.digest('hex') };
		}
	};
}

const tooLarge = (name: string, maxMb: number) =>
	new Problem(413, `${name} is larger than ${maxMb} MB, the most that is taken.`);

/** Without a chunk: whether the text ended with a whole character. */
function decodes(utf8: TextDecoder, chunk?: Uint8Array): boolean {
	try {
		utf8.decode(chunk, { stream: chunk !== undefined });
		return true;
	} catch {
		return false;
	}
}
