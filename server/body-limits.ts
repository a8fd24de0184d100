/**
 * What a request may carry, and how much. Attack stopped here: filling the memory of the process with
 * bodies, before anybody has signed in.
 */
import type { IncomingMessage, ServerResponse } from 'node:http';

const KB = 1024;
/** Forms and JSON. */
const LIMIT = 512 * KB;

/** Notes in interchange, tables of sections. */
const COMPUTING = /^\/api\/(v1|methods)\//;
const COMPUTING_LIMIT = 4096 * KB;

/** Programs send JSON. Forms would be answered by SvelteKit itself, and not in the words of the API. */
const PROGRAMS = /^\/api\/v1\//;
const JSON_KIND = /^application\/([\w.-]+\+)?json\s*(;|$)/i;

const UPLOAD = /^\/api\/notes\/[^/?]+\/evidence(\?|$)/;

type Refusal = { send(response: ServerResponse): void };

/** Evidence has its own limit: it is streamed to the store and does not gather here. */
export function bodyRefusal(request: IncomingMessage, evidenceMaxMb: number): Refusal | null {
	const isUpload = request.method === 'POST' && UPLOAD.test(request.url ?? '');
	const kind = request.headers['content-type'] ?? 'application/json';
	if (request.method === 'POST' && PROGRAMS.test(request.url ?? '') && !JSON_KIND.test(kind))
		return refusal(415, 'The body must be JSON; say so with content-type: application/json.');
	const length = request.headers['content-length'];
	if (length === undefined) {
		// The uploading route counts for itself.
		if (isUpload || !request.headers['transfer-encoding']) return null;
		return refusal(411, 'The request does not say how long it is (Content-Length).');
	}
	const plain = COMPUTING.test(request.url ?? '') ? COMPUTING_LIMIT : LIMIT;
	const limit = isUpload ? evidenceMaxMb * KB * KB : plain;
	if (Number(length) <= limit) return null;
	const most = isUpload ? `${evidenceMaxMb} MB` : `${limit / KB} kB`;
	return refusal(413, `The request carries more than ${most}.`);
}

const TITLES = { 411: 'Length required', 413: 'Too large', 415: 'Kind of body not accepted' };

function refusal(status: keyof typeof TITLES, detail: string): Refusal {
	const title = TITLES[status];
	return {
		send(response) {
			response
				.writeHead(status, { 'content-type': 'application/problem+json' })
				.end(JSON.stringify({ type: 'about:blank', title, status, detail }));
		}
	};
}
