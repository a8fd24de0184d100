import { readJson } from '$lib/server/reading';
import { requireRemark } from '$lib/server/remarks/guard';
import { settledInput } from '$lib/server/remarks/input';
import { settleRemark } from '$lib/server/remarks/thread';

export async function PUT(event) {
	const { person, ...thread } = await requireRemark(event, event.params.remark, 'remark.settle');
	const { settled } = await readJson(event.request, settledInput);
	await settleRemark(thread, person, settled);
	return new Response(null, { status: 204 });
}
