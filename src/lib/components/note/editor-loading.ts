/** Editors come when somebody is about to edit; a page that is only read never loads them. */
let loading: Promise<typeof import('./edit/ItemEditor.svelte')> | undefined;

export function loadEditor() {
	loading ??= import('./edit/ItemEditor.svelte').catch((failure: Error) => {
		// Tried anew at the next row: the connection may be back.
		loading = undefined;
		throw failure;
	});
	return loading;
}

/** Fetched ahead, so that a connection that goes between reading and typing stops nobody. */
export async function fetchEditors(): Promise<void> {
	await loadEditor()
		.then(() => import('./edit/TextEditor.svelte'))
		.catch(() => {});
}
