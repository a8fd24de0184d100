/** Calls `work` when the browser has nothing else to do; returns what calls it off. */
export function whenIdle(work: () => void, timeout?: number): () => void {
	// Safari has no idle callbacks.
	if (typeof requestIdleCallback === 'undefined') {
		const timer = setTimeout(work, 16);
		return () => clearTimeout(timer);
	}
	const idle = requestIdleCallback(work, { timeout });
	return () => cancelIdleCallback(idle);
}
