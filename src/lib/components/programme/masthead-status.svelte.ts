/** What a page puts at the right of the masthead: saved or not, who is here, the time. */
import { getContext, onDestroy, setContext, type Snippet } from 'svelte';

const KEY = Symbol('masthead status');

class MastheadStatus {
	snippet = $state<Snippet | undefined>();
}

export function provideMastheadStatus(): MastheadStatus {
	return setContext(KEY, new MastheadStatus());
}

/** Called by a page while it is made; what it shows goes when the page goes. */
export function showInMasthead(snippet: Snippet): void {
	const status = getContext<MastheadStatus>(KEY);
	status.snippet = snippet;
	onDestroy(() => {
		if (status.snippet === snippet) status.snippet = undefined;
	});
}
