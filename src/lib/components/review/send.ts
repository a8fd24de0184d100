/** What a thread sends. Each answers with the words of what went wrong; empty when it is done. */
import { problemWords } from '$lib/fetch-json';

async function send(path: string, method: 'POST' | 'PUT', body: unknown): Promise<string> {
	try {
		const response = await fetch(path, {
			method,
			headers: { 'content-type': 'application/json' },
			body: JSON.stringify(body)
		});
		return response.ok ? '' : await problemWords(response);
	} catch {
		return 'The server cannot be reached. Your words stay here; send them again.';
	}
}

export const sendRemark = (noteId: string, itemId: string, body: string) =>
	send(`/api/notes/${noteId}/remarks`, 'POST', { itemId, body });

export const sendReply = (remarkId: string, body: string) =>
	send(`/api/remarks/${remarkId}/replies`, 'POST', { body });

export const sendSettled = (remarkId: string, settled: boolean) =>
	send(`/api/remarks/${remarkId}/settled`, 'PUT', { settled });
