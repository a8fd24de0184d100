import type { z } from 'zod';
import { Problem } from './problems';

/** The body of a request in the shape that a route takes; what is wrong with it is said field by field. */
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
	const parsed = schema.safeParse(body);
	if (parsed.success) return parsed.data;
	const errors = parsed.error.issues.map(({ path, message }) => ({
		field: path.join('.'),
		message
	}));
	throw new Problem(422, errors.map(({ message }) => message).join(' '), { errors });
}
