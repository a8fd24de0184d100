/** The editor of a text item, bound to the shared fragment. */
import { Editor, Extension } from '@tiptap/core';
import { yCursorPlugin, ySyncPlugin, ySyncPluginKey } from '@tiptap/y-tiptap';
import { proseField } from '$lib/note/document';
import type { NoteWork } from '../work.svelte';
import { proseExtensions } from './prose-schema';

export function proseEditor(element: HTMLElement, id: string, work: NoteWork): Editor {
	const fragment = proseField(work.session.doc, id)!;
	// What is typed here is one's own edit, though the plugin writes it under an origin of its own.
	work.session.undoManager.addTrackedOrigin(ySyncPluginKey);
	work.asItWas?.track(ySyncPluginKey);
	const shared = Extension.create({
		name: 'shared',
		addProseMirrorPlugins: () => [
			ySyncPlugin(fragment),
			yCursorPlugin(work.session.awareness, {
				cursorBuilder: caret,
				selectionBuilder: () => ({ class: 'other-selection' })
			})
		]
	});
	return new Editor({
		element,
		injectCSS: false,
		extensions: [...proseExtensions(work.sheet), shared],
		editorProps: {
			attributes: {
				class: 'prose',
				'aria-label': 'Text',
				role: 'textbox',
				'aria-multiline': 'true'
			},
			// The editor has a use of its own for Escape.
			handleKeyDown: (_view, event) => {
				if (event.isComposing) return false;
				if (event.key === 'Escape') work.cancel();
				else if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) work.done();
				else return false;
				return true;
			}
		},
		onCreate: ({ editor }) => editor.commands.focus('end'),
		onUpdate: ({ editor }) => {
			if (editor.isFocused) work.here('types');
		}
	});
}

function caret(user: { name?: string }): HTMLElement {
	const mark = document.createElement('span');
	mark.className = 'other-caret';
	mark.dataset.name = user.name ?? '';
	return mark;
}
