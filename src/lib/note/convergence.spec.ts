import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import { addItem, itemsMap, moveItem, removeItem, setChoice, textField } from './document';
import { noteContentSchema } from './items';
import { orderedIds } from './order';
import { projectNote } from './projection';

/** One step of one replica, or a delivery between two. Positions are taken modulo what is there. */
const step = (replicas: number) => {
	const who = fc.nat(replicas - 1);
	const place = fc.nat(30);
	return fc.oneof(
		fc.record({ kind: fc.constant('add' as const), who, place }),
		fc.record({ kind: fc.constant('move' as const), who, place, to: place }),
		fc.record({ kind: fc.constant('remove' as const), who, place }),
		fc.record({ kind: fc.constant('type' as const), who, place, text: fc.string() }),
		fc.record({ kind: fc.constant('choose' as const), who, place }),
		fc.record({ kind: fc.constant('deliver' as const), who, from: fc.nat(replicas - 1) })
	);
};

const scenario = fc.integer({ min: 2, max: 4 }).chain((replicas) =>
	fc.record({
		replicas: fc.constant(replicas),
		steps: fc.array(step(replicas), { maxLength: 60 })
	})
);

function deliver(from: Y.Doc, to: Y.Doc) {
	Y.applyUpdate(to, Y.encodeStateAsUpdate(from, Y.encodeStateVector(to)));
}

describe('Replicas of a note', () => {
	it('hold the same items in the same order once everything has been delivered', () => {
		fc.assert(
			fc.property(scenario, ({ replicas, steps }) => {
				const docs = Array.from({ length: replicas }, () => new Y.Doc());
				for (const step of steps) {
					const doc = docs[step.who]!;
					const ids = orderedIds(doc);
					const id = (place: number) => ids[place % Math.max(1, ids.length)];
					if (step.kind === 'deliver') deliver(docs[step.from]!, doc);
					else if (step.kind === 'add')
						addItem(doc, { kind: 'check' }, { after: id(step.place) ?? null });
					else if (ids.length === 0) continue;
					else if (step.kind === 'move') moveItem(doc, id(step.place)!, { after: id(step.to)! });
					else if (step.kind === 'remove') removeItem(doc, id(step.place)!);
					else if (step.kind === 'choose') setChoice(doc, id(step.place)!, 'relation', 'ge');
					else textField(doc, id(step.place)!, 'left')!.insert(0, step.text);
				}
				for (const from of docs) for (const to of docs) deliver(from, to);
				for (const from of docs) for (const to of docs) deliver(from, to);
				const first = projectNote(docs[0]!);
				expect(noteContentSchema.safeParse(first).success).toBe(true);
				expect(first.items).toHaveLength(itemsMap(docs[0]!).size);
				for (const doc of docs.slice(1)) {
					expect(projectNote(doc)).toEqual(first);
					expect(itemsMap(doc).toJSON()).toEqual(itemsMap(docs[0]!).toJSON());
				}
			}),
			{ numRuns: 200 }
		);
	});

	it('put an item right below the one it was added to or moved below', () => {
		fc.assert(
			fc.property(
				fc.array(fc.record({ item: fc.nat(20), after: fc.nat(20), add: fc.boolean() })),
				(moves) => {
					const doc = new Y.Doc();
					let order = [addItem(doc, { kind: 'check' }, { after: null })];
					for (const move of moves) {
						const after = order[move.after % order.length]!;
						if (move.add) {
							const id = addItem(doc, { kind: 'check' }, { after });
							order.splice(order.indexOf(after) + 1, 0, id);
						} else {
							const id = order[move.item % order.length]!;
							if (id === after) continue;
							moveItem(doc, id, { after });
							order = order.filter((other) => other !== id);
							order.splice(order.indexOf(after) + 1, 0, id);
						}
						expect(orderedIds(doc)).toEqual(order);
					}
				}
			)
		);
	});

	it('keep two items added in one place at once apart, so that a third fits between them', () => {
		const [a, b] = [new Y.Doc(), new Y.Doc()];
		for (let time = 0; time < 20; time++) {
			addItem(a, { kind: 'section' }, { after: null });
			addItem(b, { kind: 'section' }, { after: null });
		}
		deliver(a, b);
		const [first, second] = orderedIds(b);
		const between = addItem(b, { kind: 'section' }, { after: first! });
		expect(orderedIds(b).slice(0, 3)).toEqual([first, between, second]);
	});
});
