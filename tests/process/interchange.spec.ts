/** The page about the interchange format holds the schema that the code reads by. */
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { noteContentSchema } from '$lib/note/items';
import { noteJsonSchema } from '$lib/note/json-schema';

const page = readFileSync('docs/interchange.md', 'utf8');
const blocks = [...page.matchAll(/```json\n([\s\S]*?)```/g)].map(([, json]) => JSON.parse(json!));

test('its example is a note', () => {
	expect(noteContentSchema.safeParse(blocks[0]).error).toBeUndefined();
});

test('its schema is the one in use', () => {
	expect(blocks[1]).toEqual(JSON.parse(JSON.stringify(noteJsonSchema())));
});
