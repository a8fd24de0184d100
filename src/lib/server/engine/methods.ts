/** The engine's methods as the API and the pages tell them. */
import { nearest } from '$lib/engine/calc/near';
import { METHODS } from '$lib/engine/methods/catalogue';
import { schemaOf } from '$lib/engine/methods/json-schema';
import type { AnyMethod, Description } from '$lib/engine/methods/method';
import { ENGINE_VERSION } from '$lib/engine/version';
import { Problem } from '../problems';
import { runMethod } from './evaluate';

/** @throws Problem with names like it where there is none. */
export function methodNamed(name: string): AnyMethod {
	const method = METHODS.get(name);
	if (method) return method;
	const near = nearest(name, METHODS.keys());
	const hint = near.length > 0 ? ` Is it ${near.join(' or ')}?` : '';
	throw new Problem(404, `There is no method ${name.slice(0, 80)}.${hint}`, { near });
}

/** What can be said of a method without calling it. */
export function describe({ run: _, ...method }: AnyMethod): Description {
	return method;
}

export function describeForApi(method: AnyMethod) {
	const { inputs, outputs, ...about } = describe(method);
	return {
		engine: ENGINE_VERSION,
		...about,
		inputs: schemaOf(inputs),
		outputs: schemaOf(outputs)
	};
}

export const catalogueForApi = () => ({
	engine: ENGINE_VERSION,
	methods: [...METHODS.values()].map(describeForApi)
});

/** Runs of one person at a time: nobody holds up the rest. */
const MOST_AT_ONCE = 2;
const running = new Map<string, number>();

/**
 * @param userId whose run it is
 * @throws Problem with the refusal in words where there is no result.
 */
export async function callMethod(userId: string, name: string, input: unknown) {
	const method = methodNamed(name);
	const before = running.get(userId) ?? 0;
	if (before >= MOST_AT_ONCE)
		throw new Problem(
			429,
			`${MOST_AT_ONCE} methods are being computed for you already; wait for one of them.`,
			{},
			{ 'retry-after': '2' }
		);
	running.set(userId, before + 1);
	const answer = await runMethod(method.name, input).finally(() => {
		const left = running.get(userId)! - 1;
		if (left > 0) running.set(userId, left);
		else running.delete(userId);
	});
	if (answer.ok) {
		const { method, engine, outputs, warnings } = answer;
		return { method, engine, outputs, warnings };
	}
	const { message, ...refusal } = answer.refusal;
	throw new Problem(422, message, { ...refusal, method: answer.method, engine: answer.engine });
}
