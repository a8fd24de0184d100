/** Things by a key that they have, in the order in which they come. (`Map.groupBy` is not everywhere yet.) */
export function groupBy<T>(things: readonly T[], keyOf: (thing: T) => string): Map<string, T[]> {
	const groups = new Map<string, T[]>();
	for (const thing of things) {
		const key = keyOf(thing);
		const group = groups.get(key);
		if (group) group.push(thing);
		else groups.set(key, [thing]);
	}
	return groups;
}
