/**
 * One text for one value: the form over which baselines are digested and compared.
 *
 * Objects have their keys in ascending order of UTF-16 code units, there is no white space, and strings
 * and numbers are written as ECMAScript writes them: the JSON Canonicalization Scheme (RFC 8785). Before
 * it is written, a number is rounded to 12 significant digits, because exp and log differ in the last bit
 * between platforms. The text holds no line break: control characters are escaped.
 */
export const CANONICAL_DIGITS = 12;

/** @throws RangeError for NaN and infinities, which JSON does not know. */
export function canonicalJson(value: unknown): string {
	if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
	if (value !== null && typeof value === 'object') {
		const members = Object.entries(value)
			.filter(([, member]) => member !== undefined)
			.sort(([a], [b]) => (a < b ? -1 : 1))
			.map(([key, member]) => `${JSON.stringify(key)}:${canonicalJson(member)}`);
		return `{${members.join(',')}}`;
	}
	if (typeof value === 'number') return JSON.stringify(canonicalNumber(value));
	return JSON.stringify(value);
}

/** The number at 12 significant digits; minus zero is zero. */
export function canonicalNumber(value: number): number {
	if (!Number.isFinite(value)) throw new RangeError(`${value} has no canonical form.`);
	return Number(value.toPrecision(CANONICAL_DIGITS)) + 0;
}

/**
 * Whether two numbers are the same figure on different platforms: equal to one unit in the twelfth
 * digit, since a value on the edge of rounding may fall to either side.
 */
export function sameFigure(a: number, b: number): boolean {
	return (
		canonicalNumber(a) === canonicalNumber(b) ||
		Math.abs(a - b) <= Math.max(Math.abs(a), Math.abs(b)) * 10 ** (1 - CANONICAL_DIGITS)
	);
}
