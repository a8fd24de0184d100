/** The keys of the sheet. Where a row is open or a field has the focus, only those with Alt or Ctrl work. */
import type { NoteWork } from './work.svelte';

const isTyping = (target: EventTarget | null) =>
	target instanceof HTMLElement &&
	(target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName));

/** Whether the key was one of the sheet's. */
export function pressed(event: KeyboardEvent, work: NoteWork): boolean {
	const command = event.ctrlKey || event.metaKey;
	if (command && !event.altKey && work.mayEdit) {
		const key = event.key.toLowerCase();
		if (key === 'z') return did(() => (event.shiftKey ? work.redo() : work.undo()));
		if (key === 'y') return did(() => work.redo());
	}
	const id = work.open ?? work.current;
	if (event.altKey && !command && id !== null && work.mayEdit) {
		if (event.key === 'ArrowUp') return did(() => work.moveBy(id, -1));
		if (event.key === 'ArrowDown') return did(() => work.moveBy(id, 1));
		if (event.key === 'Enter') return did(() => (work.adding = id));
	}
	if (command || event.altKey || isTyping(event.target) || !onRow(event.target)) return false;
	return id === null ? false : onRowKey(event.key, id, work);
}

function onRowKey(key: string, id: string, work: NoteWork): boolean {
	switch (key) {
		case 'ArrowUp':
			return did(() => work.step(-1));
		case 'ArrowDown':
			return did(() => work.step(1));
		case 'Enter':
			return did(() => work.edit(id));
		case 'Delete':
			return did(() => work.remove(id));
		default:
			return false;
	}
}

/** Keys act on a row only where it has the focus itself, not on a button or a link within. */
const onRow = (target: EventTarget | null) =>
	target instanceof HTMLElement && target.hasAttribute('data-item');

function did(act: () => void): true {
	act();
	return true;
}
