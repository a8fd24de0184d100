/** Order of evaluation over what an edit reaches: strongly connected components (Tarjan), suppliers first. */
export function components<T>(nodes: Iterable<T>, suppliers: (node: T) => readonly T[]): T[][] {
	const wanted = new Set(nodes);
	const index = new Map<T, number>();
	const low = new Map<T, number>();
	const stack: T[] = [];
	const stacked = new Set<T>();
	const found: T[][] = [];

	// With a stack of its own: a chain of thousands of items must not exhaust the call stack.
	type Frame = { node: T; next: readonly T[]; at: number };
	const frames: Frame[] = [];
	const enter = (node: T) => {
		low.set(node, index.size);
		index.set(node, index.size);
		stack.push(node);
		stacked.add(node);
		frames.push({ node, next: suppliers(node), at: 0 });
	};
	const lower = (node: T, to: number) => low.set(node, Math.min(low.get(node)!, to));

	for (const root of wanted) {
		if (index.has(root)) continue;
		enter(root);
		while (frames.length > 0) {
			const frame = frames.at(-1)!;
			const next = frame.next[frame.at++];
			if (next !== undefined) {
				if (!wanted.has(next)) continue;
				if (!index.has(next)) enter(next);
				else if (stacked.has(next)) lower(frame.node, index.get(next)!);
				continue;
			}
			frames.pop();
			const above = frames.at(-1);
			if (above) lower(above.node, low.get(frame.node)!);
			if (low.get(frame.node) === index.get(frame.node)) {
				const component = stack.splice(stack.lastIndexOf(frame.node));
				component.forEach((node) => stacked.delete(node));
				found.push(component);
			}
		}
	}
	return found;
}

/** The shortest way from a node back to itself along its suppliers; each step is the node reached. */
export function wayRound<T>(start: T, suppliers: (node: T) => readonly T[]): T[] {
	const cameFrom = new Map<T, T>();
	const queue = [start];
	for (const node of queue) {
		for (const next of suppliers(node)) {
			if (next === start) {
				const way = [start];
				for (let back = node; back !== start; back = cameFrom.get(back)!) way.unshift(back);
				return way;
			}
			if (cameFrom.has(next)) continue;
			cameFrom.set(next, node);
			queue.push(next);
		}
	}
	return [start];
}

/** Everything downstream of the seeds, the seeds included. */
export function reach<T>(seeds: Iterable<T>, users: (node: T) => readonly T[]): Set<T> {
	const reached = new Set(seeds);
	for (const node of reached) for (const user of users(node)) reached.add(user);
	return reached;
}
