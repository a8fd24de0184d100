/** Editors come when somebody first edits; a page that is only read never loads them. */
let loading: Promise<typeof import('./edit/ItemEditor.svelte')> | undefined;

export function loadEditor() {
	return (loading ??= import('./edit/ItemEditor.svelte'));
}
