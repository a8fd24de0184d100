/** The parameters of a programme: every quantity that its notes have frozen last. */
import { desc, eq } from 'drizzle-orm';
import { numberItems } from '$lib/note/numbering';
import { readingsOf } from '$lib/note/readings';
import type { Takeable } from '$lib/note/taken';
import type { CsvCell } from '$lib/csv';
import { db } from '../db';
import { baseline, note } from '../db/schema';
import { opened, type Baseline } from './read';
import { CAUTION, figureCells } from './tables';

export type FrozenParameter = Takeable & { baselineId: string };

/** By note and item; items without a symbol are no parameters. */
export async function parametersOf(programmeId: string): Promise<FrozenParameter[]> {
	const latest = await db
		.selectDistinctOn([note.number], { row: baseline })
		.from(baseline)
		.innerJoin(note, eq(note.id, baseline.noteId))
		.where(eq(note.programmeId, programmeId))
		.orderBy(note.number, desc(baseline.frozenAt));
	return latest.flatMap(({ row }) => parametersIn(opened(row)));
}

function parametersIn({ id, revision, head, content, results }: Baseline): FrozenParameter[] {
	const numbers = numberItems(content.items);
	const found = new Map(results.map((result) => [result.id, result]));
	return content.items.flatMap((item) =>
		readingsOf(item, found.get(item.id))
			.filter(({ symbol, check }) => symbol !== '' && !check)
			.map(({ itemId, output, symbol, symbolTex, description, outcome }) => ({
				...{ baselineId: id, noteId: head.note.id, noteNumber: head.note.number },
				...{ revision, itemId, output },
				number: numbers.get(itemId) ?? '',
				...{ symbol, symbolTex, description, outcome }
			}))
	);
}

export const parameterTable = (
	code: string,
	parameters: readonly FrozenParameter[]
): CsvCell[][] => [
	[`${code} parameters`, CAUTION],
	[
		'symbol',
		'what it is',
		'value',
		'unit',
		'std uncertainty',
		'without value',
		'note',
		'revision',
		'item'
	],
	...parameters.map(({ symbol, description, outcome, noteNumber, revision, number }) => [
		symbol,
		description,
		...figureCells(outcome),
		noteNumber,
		revision,
		number
	])
];
