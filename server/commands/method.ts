/** `npm run -s method -- NAME input.json`: one method of the engine, SI in and SI out. */
import { nearest } from '../../src/lib/engine/calc/near';
import { METHODS } from '../../src/lib/engine/methods/catalogue';
import { answer } from '../../src/lib/engine/methods/method';
import { CommandRefused, answerOnStdout, readJson } from './read-json';

const [name, file] = process.argv.slice(2);

answerOnStdout(() => {
	const known = [...METHODS.keys()];
	if (name === undefined) throw new CommandRefused(`Name a method: ${known.join(', ')}.`);
	const method = METHODS.get(name);
	if (!method) {
		const near = nearest(name, known);
		const hint = near.length > 0 ? near : known;
		throw new CommandRefused(`There is no method ${name}. There is ${hint.join(', ')}.`, { near });
	}
	const found = answer(method, readJson(file));
	const about = { method: found.method, engine: found.engine };
	if (!found.ok) {
		const { message, ...refusal } = found.refusal;
		throw new CommandRefused(message, { ...refusal, ...about });
	}
	return { ...about, outputs: found.outputs, warnings: found.warnings };
});
