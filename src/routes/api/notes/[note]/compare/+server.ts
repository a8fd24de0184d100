import { csvFile } from '$lib/csv';
import { requireNote } from '$lib/server/auth/guard';
import { comparedInput } from '$lib/server/baselines/input';
import { compareSides } from '$lib/server/baselines/sides';
import { comparisonTable } from '$lib/server/baselines/tables';
import { readQuery } from '$lib/server/reading';

/** What moved, as CSV. */
export async function GET(event) {
	const { note } = await requireNote(event, event.params.note, 'baseline.read');
	const { from, to } = readQuery(event.url, comparedInput);
	const name = `${note.number} ${from} against ${to}`;
	return csvFile(`${name}.csv`, comparisonTable(name, await compareSides(note, from, to)));
}
