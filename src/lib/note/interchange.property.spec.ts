/** A note goes out as JSON and comes back as it was, with the same results. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import type { SheetItem } from '../engine/calc/items';
import { createSheet } from '../engine/calc/sheet';
import { canonicalJson } from './canonical';
import { documentFrom, parseContent } from './interchange';
import type { Item, NoteContent } from './items';
import { projectNote } from './projection';
import { thinLimitOf, toSheetItem } from './sheet-items';

const typed = fc.oneof(
	fc.constantFrom('', 'a', 'b', 'a + b', '2 km', '[1, 2]', 'line.mass', '1e3', 'σ_d', '5 %', 'GPa'),
	fc.string({ unit: 'grapheme', maxLength: 12 })
);
const symbol = fc.constantFrom('a', 'b', 'c', 'line', 'σ_d', '');

const shape = fc.oneof(
	fc.record({ kind: fc.constant('section' as const), title: typed }),
	fc.record({
		kind: fc.constant('given' as const),
		...{ symbol, description: typed, value: typed, unit: typed, uncertainty: typed, source: typed },
		taken: fc.constantFrom('', '["n","i","","A"]')
	}),
	fc.record({
		kind: fc.constant('calculation' as const),
		...{ symbol, description: typed, expression: typed, unit: typed, digits: typed }
	}),
	fc.record({
		kind: fc.constant('check' as const),
		relation: fc.constantFrom('le' as const, 'ge' as const, 'within' as const),
		...{ description: typed, left: typed, right: typed, tolerance: typed, required: typed }
	})
);

const content: fc.Arbitrary<NoteContent> = fc
	.record({
		shapes: fc.array(shape, { maxLength: 10 }),
		thinLimit: fc.constantFrom('0.1', '', 'x')
	})
	.map(({ shapes, thinLimit }) => ({
		format: 'holdfast-note',
		version: 1,
		thinLimit,
		items: shapes.map((shape, i): Item => ({ id: `item-${i}`, ...shape }))
	}));

function resultsOf(items: readonly Item[], thinLimit: string) {
	const sheet = createSheet();
	const upsert = items.map(toSheetItem).filter((item): item is SheetItem => item !== null);
	sheet.apply({ upsert, order: items.map(({ id }) => id), thinLimit: thinLimitOf(thinLimit) });
	return sheet.results();
}

describe('a note in interchange', () => {
	it('comes out of a document as it was put in, and evaluates the same', () => {
		fc.assert(
			fc.property(content, (note) => {
				const read = parseContent(JSON.parse(JSON.stringify(note)));
				const written = projectNote(documentFrom(read));
				expect(written).toEqual(note);
				expect(canonicalJson(written)).toBe(canonicalJson(note));
				expect(resultsOf(written.items, written.thinLimit)).toEqual(
					resultsOf(note.items, note.thinLimit)
				);
			})
		);
	});

	it('crosses to another replica whole', () => {
		fc.assert(
			fc.property(content, (note) => {
				const other = new Y.Doc();
				Y.applyUpdate(other, Y.encodeStateAsUpdate(documentFrom(note)));
				expect(projectNote(other)).toEqual(note);
			})
		);
	});
});
