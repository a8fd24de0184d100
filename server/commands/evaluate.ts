/** `npm run -s evaluate -- note.json`: a note in interchange in, the result of each item out. */
import * as z from 'zod/mini';
import { ENGINE_VERSION } from '../../src/lib/engine/version';
import { noteTask, run } from '../../src/lib/engine-task';
import { noteContentSchema } from '../../src/lib/note/items';
import { CommandRefused, answerOnStdout, readJson } from './read-json';

// The small form of zod brings no words of its own.
z.config(z.locales.en());

answerOnStdout(() => {
	const read = noteContentSchema.safeParse(readJson(process.argv[2]));
	if (!read.success) {
		const errors = read.error.issues.map(({ path, message }) => ({
			field: path.join('.'),
			message
		}));
		const places = errors.map(({ field, message }) => `${field || 'the whole'}: ${message}`);
		throw new CommandRefused(`This is no note in interchange. ${places.join('; ')}.`, { errors });
	}
	return { engine: ENGINE_VERSION, results: run(noteTask(read.data)) };
});
