import { json } from '@sveltejs/kit';
import { requireBaseline } from '$lib/server/baselines/guard';
import { opened } from '$lib/server/baselines/read';

export async function GET(event) {
	const { row } = await requireBaseline(event, event.params.baseline, 'baseline.read');
	return json(opened(row));
}
