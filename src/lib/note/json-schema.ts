/** JSON schema (draft 2020-12) of a note in interchange, made from the schema that reads it. */
import * as z from 'zod/mini';
import { noteContentSchema } from './items';

export const noteJsonSchema = () => ({
	title: 'Holdfast design note, interchange format, version 1',
	description:
		'Items in sheet order. What people type stands as they typed it: values, units and expressions are texts, read by the engine.',
	...z.toJSONSchema(noteContentSchema, { target: 'draft-2020-12', io: 'input' })
});
