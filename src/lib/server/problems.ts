/** Failures that a person can be told about, and their answers over HTTP (RFC 9457 problem+json). */

export type ProblemStatus = 400 | 401 | 403 | 404 | 405 | 409 | 413 | 415 | 422 | 429 | 500 | 503;

/** A failure with a message for the person; routes and the API show it as it stands. */
export class Problem extends Error {
	constructor(
		readonly status: ProblemStatus,
		/** What is wrong, naming the thing and the reason. */
		message: string,
		/** Further members of the problem document, e.g. the list of failing checks. */
		readonly details: Record<string, unknown> = {},
		/** Headers of the answer, e.g. how long to wait. */
		readonly headers: Record<string, string> = {}
	) {
		super(message);
	}
}

export const TITLES: Record<ProblemStatus, string> = {
	400: 'The request cannot be read',
	401: 'Not signed in',
	403: 'Not allowed',
	404: 'Not found',
	405: 'Not to be asked so',
	409: 'In conflict with what is stored',
	413: 'Too large',
	415: 'Kind of file not accepted',
	422: 'Something is to be put right',
	429: 'Too many tries',
	500: 'Something went wrong',
	503: 'Not available just now'
};

export function problemResponse(problem: Problem): Response {
	const body = {
		type: 'about:blank',
		title: TITLES[problem.status],
		status: problem.status,
		detail: problem.message,
		...problem.details
	};
	return new Response(JSON.stringify(body), {
		status: problem.status,
		headers: { 'content-type': 'application/problem+json', ...problem.headers }
	});
}
