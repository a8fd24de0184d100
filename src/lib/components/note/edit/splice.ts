/** One change of a text: at `at`, `removed` characters go and `inserted` comes. */
export type Splice = { at: number; removed: number; inserted: string };

/**
 * The change that made `after` of `before`. `caret` is where the caret stands after it: of several
 * changes that give the same text ("aa" → "aaa") it is the one that ends there.
 */
export function spliceOf(before: string, after: string, caret: number): Splice | null {
	if (before === after) return null;
	// What follows the caret was not touched by typing: match it first.
	const tail = Math.min(before.length, after.length - Math.min(caret, after.length));
	let suffix = 0;
	while (suffix < tail && at(before, suffix) === at(after, suffix)) suffix += 1;
	let prefix = 0;
	const most = Math.min(before.length, after.length) - suffix;
	while (prefix < most && before[prefix] === after[prefix]) prefix += 1;
	// A caret in front of the change (forward delete, undo by the browser): match the end further.
	while (
		suffix < Math.min(before.length, after.length) - prefix &&
		at(before, suffix) === at(after, suffix)
	)
		suffix += 1;
	return {
		at: prefix,
		removed: before.length - suffix - prefix,
		inserted: after.slice(prefix, after.length - suffix)
	};
}

const at = (text: string, fromEnd: number) => text[text.length - 1 - fromEnd];

/** A change of a shared text as Yjs tells it. */
export type Delta = readonly { retain?: number; insert?: unknown; delete?: number }[];

/** Where a position of the text is after a change by somebody else. Text put in right at it follows it. */
export function shift(position: number, delta: Delta): number {
	let index = 0;
	let moved = position;
	for (const step of delta) {
		if (index >= moved && step.retain === undefined && step.delete === undefined) break;
		if (step.retain !== undefined) index += step.retain;
		else if (typeof step.insert === 'string') {
			if (index < moved) moved += step.insert.length;
			index += step.insert.length;
		} else if (step.delete !== undefined) {
			moved -= Math.max(0, Math.min(step.delete, moved - index));
		}
	}
	return moved;
}
