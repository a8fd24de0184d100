import { json } from '@sveltejs/kit';
import { requireBaseline } from '$lib/server/baselines/guard';
import { verifyBaseline } from '$lib/server/baselines/verify';

export async function POST(event) {
	const { row } = await requireBaseline(event, event.params.baseline, 'baseline.verify');
	return json(await verifyBaseline(row));
}
