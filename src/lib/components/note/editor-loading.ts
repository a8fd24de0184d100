/**
 * Editors come when somebody first edits; a page that is only read never loads them. The service worker
 * keeps them, so that this works without a connection as well.
 */
let loading: Promise<typeof import('./edit/ItemEditor.svelte')> | undefined;

export function loadEditor() {
	loading ??= import('./edit/ItemEditor.svelte').catch((failure: Error) => {
		// Tried anew at the next row: the connection may be back.
		loading = undefined;
		throw failure;
	});
	return loading;
}
