export type ByteRange = { first: number; last: number };

/**
 * The one range of a Range header (RFC 9110 §14.1.2) within `size` bytes. Several ranges, or what is no
 * range of bytes, are answered with the whole (null), as the standard allows.
 */
export function byteRange(header: string | null, size: number): ByteRange | null | 'beyond' {
	const match = /^bytes=(\d*)-(\d*)$/.exec(header ?? '');
	if (!match || match[0] === 'bytes=-') return null;
	const [from, to] = [match[1]!, match[2]!];
	if (from === '') {
		const count = Number(to);
		return count === 0 ? 'beyond' : { first: Math.max(size - count, 0), last: size - 1 };
	}
	const first = Number(from);
	if (first >= size) return 'beyond';
	const last = to === '' ? size - 1 : Math.min(Number(to), size - 1);
	return first <= last ? { first, last } : null;
}
