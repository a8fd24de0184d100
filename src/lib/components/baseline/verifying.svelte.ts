import { fetchJson } from '$lib/fetch-json';
import type { Verification } from '$lib/server/baselines/verify';

/** Asking the server to recompute a baseline, and what it found. */
export class Verifying {
	found = $state.raw<Verification | null>(null);
	running = $state(false);
	failure = $state('');

	constructor(private baselineId: string) {}

	async run(): Promise<void> {
		if (this.running) return;
		this.running = true;
		this.failure = '';
		try {
			this.found = await fetchJson(`/api/baselines/${this.baselineId}/verify`, { method: 'POST' });
		} catch (error) {
			this.failure = (error as Error).message;
		} finally {
			this.running = false;
		}
	}
}
