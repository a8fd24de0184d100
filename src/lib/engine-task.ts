/** What the engine is asked for outside a page: in the server's threads and on the command line alike. */
import type { SheetChange } from './engine/calc/items';
import type { ItemResult } from './engine/calc/results';
import { createSheet } from './engine/calc/sheet';
import { METHODS } from './engine/methods/catalogue';
import { answer, type Answer } from './engine/methods/method';
import type { NoteContent } from './note/items';
import { thinLimitOf, toSheetItem } from './note/sheet-items';

export type EngineTask =
	{ kind: 'note'; change: SheetChange } | { kind: 'method'; name: string; input: unknown };

export const noteTask = (content: NoteContent): EngineTask => ({
	kind: 'note',
	change: {
		upsert: content.items.flatMap((item) => toSheetItem(item) ?? []),
		order: content.items.map(({ id }) => id),
		thinLimit: thinLimitOf(content.thinLimit)
	}
});

/** The method's name is one of the catalogue's. */
export function run(task: EngineTask): ItemResult[] | Answer {
	if (task.kind === 'method') return answer(METHODS.get(task.name)!, task.input);
	const sheet = createSheet();
	sheet.apply(task.change);
	return sheet.results();
}
