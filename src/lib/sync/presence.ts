/** Who is on a note and where: the awareness state that clients share, as the server lets it through. */
import * as z from 'zod/mini';

export const activitySchema = z.enum(['reads', 'types', 'remarks']);
export type Activity = z.infer<typeof activitySchema>;

/** What a client says of itself. */
export const ownStateSchema = z.object({
	/** The item where the person is. */
	itemId: z.catch(z.nullable(z.string().check(z.maxLength(64))), null),
	activity: z.catch(activitySchema, 'reads'),
	/** The caret in prose: two relative positions, written and read by the editor's caret plugin. */
	cursor: z.catch(z.nullable(z.object({ anchor: z.json(), head: z.json() })), null)
});

/** What others see: the same, with who it is set by the server. */
export const sharedStateSchema = z.extend(ownStateSchema, {
	user: z.object({ id: z.string(), name: z.string() })
});
export type SharedState = z.infer<typeof sharedStateSchema>;

export type PersonHere = {
	clientId: number;
	userId: string;
	name: string;
	itemId: string | null;
	activity: Activity;
};
