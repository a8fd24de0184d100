/** Hands a table that the page has to the person, as a file. */
import { csv, type CsvCell } from '$lib/csv';

export function saveCsv(name: string, rows: readonly (readonly CsvCell[])[]): void {
	const link = document.createElement('a');
	link.href = URL.createObjectURL(new Blob([csv(rows)], { type: 'text/csv' }));
	link.download = `${name.replace(/[^\w.-]+/g, '-')}.csv`;
	link.click();
	URL.revokeObjectURL(link.href);
}
