/** A file on its way to the note's evidence, with its progress. */
import type { EvidenceFile } from '$lib/note/items';

export type Upload = {
	key: string;
	name: string;
	size: number;
	sent: number;
	/** Why it was not taken; empty while it is on its way. */
	failure: string;
	cancel(): void;
};

/** `fetch` tells nothing of how much has gone, XMLHttpRequest does. */
export function upload(
	noteId: string,
	file: File,
	arrived: (upload: Upload, file: EvidenceFile) => void
): Upload {
	const request = new XMLHttpRequest();
	const state: Upload = $state({
		key: crypto.randomUUID(),
		name: file.name,
		size: file.size,
		sent: 0,
		failure: '',
		cancel: () => request.abort()
	});
	request.upload.onprogress = ({ loaded }) => (state.sent = Math.min(loaded, file.size));
	request.onload = () => {
		if (request.status < 300) arrived(state, JSON.parse(request.responseText) as EvidenceFile);
		else state.failure = detail(request);
	};
	request.onerror = () => (state.failure = 'The connection was lost. Try again.');
	request.onabort = () => (state.failure = 'You cancelled it.');
	request.open('POST', `/api/notes/${noteId}/evidence?name=${encodeURIComponent(file.name)}`);
	// The body is the file itself: nothing is held in memory whole on either side.
	request.setRequestHeader('content-type', file.type || 'application/octet-stream');
	request.send(file);
	return state;
}

function detail(request: XMLHttpRequest): string {
	try {
		return String((JSON.parse(request.responseText) as { detail?: string }).detail ?? '');
	} catch {
		return `The server answered ${request.status}.`;
	}
}
