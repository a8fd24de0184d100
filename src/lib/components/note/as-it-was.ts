/** An item as it was when it was opened: taking back what oneself has typed into it since, and only that. */
import * as Y from 'yjs';
import { heldItem } from '$lib/note/document';

export class AsItWas {
	#undo: Y.UndoManager | null;

	constructor(doc: Y.Doc, id: string, origin: unknown) {
		const item = heldItem(doc, id);
		this.#undo =
			item &&
			new Y.UndoManager(item, {
				trackedOrigins: new Set([origin]),
				// All that is typed while the item is open is one step.
				captureTimeout: Number.MAX_SAFE_INTEGER
			});
	}

	/** An editor that writes under an origin of its own joins in. */
	track(origin: unknown): void {
		this.#undo?.addTrackedOrigin(origin);
	}

	get changed(): boolean {
		return (this.#undo?.undoStack.length ?? 0) > 0;
	}

	restore(): void {
		while (this.#undo?.undo());
	}

	forget(): void {
		this.#undo?.destroy();
		this.#undo = null;
	}
}
