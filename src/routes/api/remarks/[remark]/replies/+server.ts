import { readJson } from '$lib/server/reading';
import { requireRemark } from '$lib/server/remarks/guard';
import { replyInput } from '$lib/server/remarks/input';
import { answerRemark } from '$lib/server/remarks/thread';

export async function POST(event) {
	const { person, ...thread } = await requireRemark(event, event.params.remark, 'remark.write');
	const { body } = await readJson(event.request, replyInput);
	await answerRemark(thread, person, body);
	return new Response(null, { status: 204 });
}
