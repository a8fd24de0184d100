/** Order of evaluation over what an edit reaches: strongly connected components (Tarjan), suppliers first. */
export function components(
	ids: Iterable<string>,
	suppliers: (id: string) => readonly string[]
): string[][] {
	const wanted = new Set(ids);
	const index = new Map<string, number>();
	const low = new Map<string, number>();
	const stack: string[] = [];
	const stacked = new Set<string>();
	const found: string[][] = [];

	// With a stack of its own: a chain of thousands of items must not exhaust the call stack.
	type Frame = { id: string; next: readonly string[]; at: number };
	const frames: Frame[] = [];
	const enter = (id: string) => {
		index.set(id, index.size);
		low.set(id, index.get(id)!);
		stack.push(id);
		stacked.add(id);
		frames.push({ id, next: suppliers(id), at: 0 });
	};
	const lower = (id: string, to: number) => low.set(id, Math.min(low.get(id)!, to));

	for (const root of wanted) {
		if (index.has(root)) continue;
		enter(root);
		while (frames.length > 0) {
			const frame = frames.at(-1)!;
			const next = frame.next[frame.at++];
			if (next !== undefined) {
				if (!wanted.has(next)) continue;
				if (!index.has(next)) enter(next);
				else if (stacked.has(next)) lower(frame.id, index.get(next)!);
				continue;
			}
			frames.pop();
			const above = frames.at(-1);
			if (above) lower(above.id, low.get(frame.id)!);
			if (low.get(frame.id) === index.get(frame.id)) {
				const start = stack.lastIndexOf(frame.id);
				const component = stack.splice(start);
				component.forEach((id) => stacked.delete(id));
				found.push(component);
			}
		}
	}
	return found;
}

/** The shortest way from an item back to itself along its suppliers; each step is the item reached. */
export function wayRound(start: string, suppliers: (id: string) => readonly string[]): string[] {
	const cameFrom = new Map<string, string>();
	const queue = [start];
	for (const id of queue) {
		for (const next of suppliers(id)) {
			if (next === start) {
				const way = [start];
				for (let back = id; back !== start; back = cameFrom.get(back)!) way.unshift(back);
				return way;
			}
			if (cameFrom.has(next)) continue;
			cameFrom.set(next, id);
			queue.push(next);
		}
	}
	return [start];
}

/** Everything downstream of the seeds, the seeds included. */
export function reach(
	seeds: Iterable<string>,
	users: (id: string) => readonly string[]
): Set<string> {
	const reached = new Set(seeds);
	for (const id of reached) for (const user of users(id)) reached.add(user);
	return reached;
}
