import { csvFile } from '$lib/csv';
import { requireBaseline } from '$lib/server/baselines/guard';
import { opened } from '$lib/server/baselines/read';
import { quantityTable } from '$lib/server/baselines/tables';

export async function GET(event) {
	const { row, note } = await requireBaseline(event, event.params.baseline, 'baseline.read');
	return csvFile(`${note.number} baseline ${row.revision}.csv`, quantityTable(opened(row)));
}
