/** Our own API from a page: JSON, or the server's words for what went wrong (RFC 9457). */

/** A refusal, with the words of its problem document and its status. */
export class Refused extends Error {
	constructor(
		readonly status: number,
		message: string
	) {
		super(message);
	}
}

export async function fetchJson<T>(path: string, init?: RequestInit): Promise<T> {
	const response = await fetch(path, init);
	if (response.ok) return (await response.json()) as T;
	throw new Refused(response.status, await problemWords(response));
}

export async function problemWords(response: Response): Promise<string> {
	const fallback = `The server answered ${response.status}. Try again in a moment.`;
	const problem: unknown = await response.json().catch(() => null);
	const detail = (problem as { detail?: unknown } | null)?.detail;
	return typeof detail === 'string' && detail !== '' ? detail : fallback;
}
