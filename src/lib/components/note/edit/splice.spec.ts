import fc from 'fast-check';
import { expect, test } from 'vitest';
import * as Y from 'yjs';
import { shift, spliceOf, type Delta } from './splice';

const apply = (text: string, { at, removed, inserted }: NonNullable<ReturnType<typeof spliceOf>>) =>
	text.slice(0, at) + inserted + text.slice(at + removed);

test('typing in the middle puts in only what was typed', () => {
	expect(spliceOf('σ_d/FS', 'σ_d/2FS', 5)).toEqual({ at: 4, removed: 0, inserted: '2' });
});

test('of equal letters the one at the caret is the new one', () => {
	expect(spliceOf('aa', 'aaa', 1)).toEqual({ at: 0, removed: 0, inserted: 'a' });
	expect(spliceOf('aa', 'aaa', 3)).toEqual({ at: 2, removed: 0, inserted: 'a' });
});

test('replacing a selection changes only the letters that differ', () => {
	expect(spliceOf('m_lift g', 'm_tot g', 5)).toEqual({ at: 2, removed: 3, inserted: 'to' });
});

test('the change found always gives the text, wherever the caret is', () => {
	const text = fc.string({ unit: fc.constantFrom('a', 'b', 'σ'), maxLength: 8 });
	fc.assert(
		fc.property(text, text, fc.nat(10), (before, after, caret) => {
			const splice = spliceOf(before, after, caret);
			expect(splice ? apply(before, splice) : before).toBe(after);
		})
	);
});

test('a caret keeps its letter when somebody else types or deletes', () => {
	fc.assert(
		fc.property(
			fc.string({ minLength: 1, maxLength: 8 }),
			fc.nat(8),
			fc.nat(8),
			fc.nat(4),
			fc.string({ maxLength: 3 }),
			(start, caret, at, removed, inserted) => {
				const text = new Y.Doc().getText();
				text.insert(0, start);
				const position = Math.min(caret, text.length);
				const from = Math.min(at, text.length);
				const count = Math.min(removed, text.length - from);
				// Yjs itself says where the caret belongs: a position that keeps to its left neighbour.
				const relative = Y.createRelativePositionFromTypeIndex(text, position, -1);
				let delta: Delta = [];
				text.observe((event) => (delta = event.delta as Delta));
				text.doc!.transact(() => {
					text.delete(from, count);
					text.insert(from, inserted);
				});
				const moved = shift(position, delta);
				const expected = Y.createAbsolutePositionFromRelativePosition(relative, text.doc!)!.index;
				// Where the letters around it are gone too, before or after the new text are both right.
				const inside = position > from && position <= from + count;
				if (inside) expect([expected, from, from + inserted.length]).toContain(moved);
				else expect(moved).toBe(expected);
			}
		)
	);
});
