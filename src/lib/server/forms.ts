/**
 * Posted forms, one way everywhere: read with a schema, handed to one service, and answered so that the
 * page shows again what was typed with a sentence at each field that is to be put right.
 */
import { fail, type ActionFailure } from '@sveltejs/kit';
import { z } from 'zod';
import { Problem } from './problems';

export type FormAnswer = {
	/** Which form of the page this answers, and for which row. */
	form: string;
	id: string;
	done: boolean;
	values: Record<string, string>;
	errors: Record<string, string[] | undefined>;
	/** What is wrong with the whole, and what the Problem says beside its words. */
	message: string;
	details: Record<string, unknown>;
};

const SECRET = /password/i;

/**
 * `work` may throw a Problem, which is shown at the form, or a redirect. What it answers with stands in
 * the details, for what is to be seen this once.
 */
export async function answerForm<S extends z.ZodObject>(
	request: Request,
	form: string,
	schema: S,
	work: (data: z.infer<S>) => Promise<void | Record<string, unknown>>
): Promise<FormAnswer | ActionFailure<FormAnswer>> {
	const posted = Object.fromEntries(await request.formData());
	const typed = Object.fromEntries(
		Object.entries(posted).filter((pair): pair is [string, string] => typeof pair[1] === 'string')
	);
	const values = Object.fromEntries(Object.entries(typed).filter(([name]) => !SECRET.test(name)));
	const answer: FormAnswer = {
		form,
		id: typed.id ?? '',
		done: false,
		values,
		errors: {},
		message: '',
		details: {}
	};
	const parsed = schema.safeParse(typed);
	if (!parsed.success)
		return fail(422, { ...answer, errors: z.flattenError(parsed.error).fieldErrors });
	try {
		answer.details = (await work(parsed.data)) ?? {};
	} catch (problem) {
		if (!(problem instanceof Problem)) throw problem;
		const { status, message, details } = problem;
		return fail(status, { ...answer, message, details });
	}
	return { ...answer, done: true, values: {} };
}
