/** Asks the API; a refusal is an error with the words of its problem document and its status. */
export class Refused extends Error {
	constructor(
		readonly status: number,
		message: string
	) {
		super(message);
	}
}

export async function fetchJson<T>(address: string): Promise<T> {
	const response = await fetch(address, { headers: { accept: 'application/json' } });
	if (response.ok) return response.json();
	const problem = await response.json().catch(() => ({}));
	throw new Refused(response.status, problem.detail ?? `The server answers ${response.status}.`);
}
