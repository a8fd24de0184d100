/** Moving a row by its number: the row follows no pointer, a rule shows where it would stand. */
import type { NoteWork } from './work.svelte';

/** Pointer travel in px before a press on the handle becomes a move; less is a click. */
const TRAVEL = 5;

/** The click that may end a move opens no row; it comes right after, or not at all. */
function swallowClick(): void {
	const swallow = (event: Event) => event.stopPropagation();
	addEventListener('click', swallow, { capture: true });
	setTimeout(() => removeEventListener('click', swallow, { capture: true }));
}

export function dragRows(list: HTMLElement, work: NoteWork): () => void {
	let from: { id: string; y: number } | null = null;
	let to: { row: HTMLElement; below: boolean } | null = null;
	const rule = document.createElement('div');
	rule.className = 'drop-rule';

	const end = () => {
		from = to = null;
		rule.remove();
	};
	const down = (event: PointerEvent) => {
		const target = event.target as HTMLElement;
		const id = target.closest('[data-item]')?.id;
		if (event.button !== 0 || id === undefined || !target.closest('[data-handle]')) return;
		if (work.mayEdit) from = { id, y: event.clientY };
	};
	const move = (event: PointerEvent) => {
		if (!from || (!to && Math.abs(event.clientY - from.y) < TRAVEL)) return;
		event.preventDefault();
		const x = list.getBoundingClientRect().right - 40;
		const row = document.elementFromPoint(x, event.clientY)?.closest<HTMLElement>('[data-item]');
		if (!row) return;
		const { top, height } = row.getBoundingClientRect();
		to = { row, below: event.clientY > top + height / 2 };
		rule.style.top = `${row.offsetTop + (to.below ? row.offsetHeight : 0) - 1}px`;
		list.append(rule);
	};
	const up = () => {
		if (from && to) {
			const { order } = work.sheet;
			const index = order.indexOf(to.row.id);
			const after = to.below ? to.row.id : (order[index - 1] ?? null);
			if (after !== from.id && to.row.id !== from.id) work.move(from.id, after);
			swallowClick();
		}
		end();
	};
	const key = (event: KeyboardEvent) => {
		if (event.key === 'Escape' && from) end();
	};

	list.addEventListener('pointerdown', down);
	addEventListener('pointermove', move);
	addEventListener('pointerup', up);
	addEventListener('pointercancel', end);
	addEventListener('keydown', key);
	return () => {
		list.removeEventListener('pointerdown', down);
		removeEventListener('pointermove', move);
		removeEventListener('pointerup', up);
		removeEventListener('pointercancel', end);
		removeEventListener('keydown', key);
	};
}
