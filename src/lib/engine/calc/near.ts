/** Names that differ from a mistyped one by little. */
export function nearest(name: string, known: Iterable<string>, most = 3): string[] {
	const wanted = simple(name);
	const scored: [number, string][] = [];
	for (const candidate of known) {
		const other = simple(candidate);
		const begins = name.length > 1 && other.startsWith(wanted);
		const away = begins ? 0.5 : distance(wanted, other);
		// One letter for another is no slip but another name.
		const slip = away < wanted.length && away <= Math.max(1, Math.floor(wanted.length / 3));
		if (begins || slip) scored.push([away, candidate]);
	}
	scored.sort(([a, x], [b, y]) => a - b || (x < y ? -1 : 1));
	return scored.slice(0, most).map(([, candidate]) => candidate);
}

const simple = (name: string) => name.toLowerCase().replaceAll('_', '').slice(0, 40);

/** Levenshtein distance. */
function distance(a: string, b: string): number {
	let row = Array.from({ length: b.length + 1 }, (_, i) => i);
	for (let i = 1; i <= a.length; i += 1) {
		const next = [i];
		for (let j = 1; j <= b.length; j += 1) {
			const same = a[i - 1] === b[j - 1] ? 0 : 1;
			next.push(Math.min(next[j - 1]! + 1, row[j]! + 1, row[j - 1]! + same));
		}
		row = next;
	}
	return row[b.length]!;
}
