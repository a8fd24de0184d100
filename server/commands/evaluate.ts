/** `npm run -s evaluate -- note.json`: a note in interchange in, the result of each item out. */
import * as z from 'zod/mini';
import { ENGINE_VERSION } from '../../src/lib/engine/version';
import { noteTask, run } from '../../src/lib/engine-task';
import { inSentences, misfitsOf } from '../../src/lib/json/refusals';
import { noteContentSchema } from '../../src/lib/note/items';
import { CommandRefused, answerOnStdout, readJson } from './read-json';

// The small form of zod brings no words of its own.
z.config(z.locales.en());

answerOnStdout(() => {
	const read = noteContentSchema.safeParse(readJson(process.argv[2]));
	if (!read.success) {
		const errors = misfitsOf(read.error);
		throw new CommandRefused(`This is no note in interchange. ${inSentences(errors)}`, { errors });
	}
	return { engine: ENGINE_VERSION, results: run(noteTask(read.data)) };
});
