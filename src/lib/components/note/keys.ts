/** The keys of the sheet. Where a row is open or a field has the focus, only those with Alt or Ctrl work. */
import type { NoteWork } from './work.svelte';

/** Whether the key was one of the sheet's. */
export function pressed(event: KeyboardEvent, work: NoteWork): boolean {
	const command = event.ctrlKey || event.metaKey;
	if (command && !event.altKey && work.mayEdit) {
		const key = event.key.toLowerCase();
		if (key === 'z') return did(() => (event.shiftKey ? work.redo() : work.undo()));
		if (key === 'y') return did(() => work.redo());
	}
	const id = rowOf(event.target);
	if (id === undefined || command) return false;
	if (event.altKey) return work.mayEdit && withAlt(event.key, id, work);
	return onRow(event.target) && alone(event.key, id, work);
}

/** These work from within an open row as well. */
function withAlt(key: string, id: string, work: NoteWork): boolean {
	switch (key) {
		case 'ArrowUp':
			return did(() => work.moveBy(id, -1));
		case 'ArrowDown':
			return did(() => work.moveBy(id, 1));
		case 'Enter':
			return did(() => (work.adding = id));
		default:
			return false;
	}
}

function alone(key: string, id: string, work: NoteWork): boolean {
	switch (key) {
		case 'ArrowUp':
			return did(() => work.step(id, -1));
		case 'ArrowDown':
			return did(() => work.step(id, 1));
		case 'Enter':
			return did(() => work.edit(id));
		case 'Delete':
			return did(() => work.remove(id));
		default:
			return false;
	}
}

const rowOf = (target: EventTarget | null) =>
	target instanceof HTMLElement ? target.closest<HTMLElement>('[data-item]')?.id : undefined;

/** Keys without Alt act on a row where it has the focus itself, not on a button or a link within. */
const onRow = (target: EventTarget | null) =>
	target instanceof HTMLElement && target.hasAttribute('data-item');

function did(act: () => void): true {
	act();
	return true;
}
