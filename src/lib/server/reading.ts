/** What a request says, in the shape that a route takes; what is wrong with it is said field by field. */
import { core } from 'zod';
import { DEEPEST, inSentences, isTooDeep, misfitsOf } from '$lib/json/refusals';
import { Problem } from './problems';

export async function readJson<T extends core.$ZodType>(
	request: Request,
	schema: T
): Promise<core.output<T>> {
	let body: unknown;
	try {
		body = await request.json();
	} catch {
		throw new Problem(400, 'The body of the request is not JSON.');
	}
	if (isTooDeep(body))
		throw new Problem(422, `The body is nested more than ${DEEPEST} levels deep.`);
	return parsed(body, schema);
}

export function readQuery<T extends core.$ZodType>(url: URL, schema: T): core.output<T> {
	return parsed(Object.fromEntries(url.searchParams), schema);
}

function parsed<T extends core.$ZodType>(value: unknown, schema: T): core.output<T> {
	const found = core.safeParse(schema, value);
	if (found.success) return found.data;
	const errors = misfitsOf(found.error);
	throw new Problem(422, inSentences(errors), { errors });
}
