/** Whether two plain results say the same. */
export function same(a: unknown, b: unknown): boolean {
	if (a === b) return true;
	if (typeof a !== 'object' || typeof b !== 'object' || !a || !b) return false;
	if (Array.isArray(a)) {
		return Array.isArray(b) && a.length === b.length && a.every((value, i) => same(value, b[i]));
	}
	const keys = Object.keys(a);
	if (keys.length !== Object.keys(b).length) return false;
	return keys.every((key) =>
		same((a as Record<string, unknown>)[key], (b as Record<string, unknown>)[key])
	);
}
