/** Where rows are on the page, in px from its top: measured, because an open row is taller. */
export type Places = { top: number; height: number; of: ReadonlyMap<string, number> };

export const NOWHERE: Places = { top: 0, height: 1, of: new Map() };

/** Middle of the first line of a row, px below its top. */
const FIRST_LINE = 20;

export function measureRows(list: HTMLElement): Places {
	const top = list.getBoundingClientRect().top + window.scrollY;
	const rows = list.querySelectorAll<HTMLElement>('[data-item]');
	return {
		top,
		height: Math.max(1, list.offsetHeight),
		of: new Map([...rows].map((row) => [row.id, top + row.offsetTop + FIRST_LINE]))
	};
}
