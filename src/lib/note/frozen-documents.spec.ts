/** Documents written by earlier versions must open forever, as what they were. */
import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import { documentFrom, parseContent } from './interchange';
import { projectNote } from './projection';

const FOLDER = new URL('../../../tests/documents/', import.meta.url);
const names = readdirSync(FOLDER).filter((name) => name.endsWith('.json'));

const read = (name: string): { about: string; updates: string[]; content: unknown } =>
	JSON.parse(readFileSync(new URL(name, FOLDER), 'utf8'));

function opened(updates: string[]): Y.Doc {
	const doc = new Y.Doc();
	for (const update of updates) Y.applyUpdate(doc, Buffer.from(update, 'base64'));
	return doc;
}

it('There are frozen documents', () => {
	expect(names.length).toBeGreaterThanOrEqual(4);
});

describe.each(names)('The frozen document %s', (name) => {
	const { updates, content: written } = read(name);
	// Fields that came since are blank.
	const content = parseContent(written);

	it('reads as it was written', () => {
		expect(projectNote(opened(updates))).toEqual(content);
	});

	it('reads the same when its updates come in another order, and when they are folded into one', () => {
		expect(projectNote(opened(updates.toReversed()))).toEqual(content);
		const folded = Y.mergeUpdates(updates.map((update) => Buffer.from(update, 'base64')));
		expect(projectNote(opened([Buffer.from(folded).toString('base64')]))).toEqual(content);
	});

	it('has a content that can still be taken in', () => {
		expect(projectNote(documentFrom(parseContent(written)))).toEqual(content);
	});
});
