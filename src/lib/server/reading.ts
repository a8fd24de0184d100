/** What a request says, in the shape that a route takes; what is wrong with it is said field by field. */
import type { z } from 'zod';
import { Problem } from './problems';

export async function readJson<T extends z.ZodType>(
	request: Request,
	schema: T
): Promise<z.output<T>> {
	let body: unknown;
	try {
		body = await request.json();
	} catch {
		throw new Problem(400, 'The body of the request is not JSON.');
	}
	return parsed(body, schema);
}

export function readQuery<T extends z.ZodType>(url: URL, schema: T): z.output<T> {
	return parsed(Object.fromEntries(url.searchParams), schema);
}

function parsed<T extends z.ZodType>(value: unknown, schema: T): z.output<T> {
	const found = schema.safeParse(value);
	if (found.success) return found.data;
	const errors = found.error.issues.map(({ path, message }) => ({
		field: path.join('.'),
		message
	}));
	throw new Problem(422, errors.map(({ message }) => message).join(' '), { errors });
}
