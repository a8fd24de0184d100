import { eq } from 'drizzle-orm';
import { isUuid, requireNote, requirePerson } from '../auth/guard';
import type { ProgrammeAction } from '../auth/permissions';
import type { SignedIn } from '../auth/sessions';
import { db } from '../db';
import { remark } from '../db/schema';
import { Problem } from '../problems';

/** The remark with an id and where it is pinned, for somebody who may take the action there. */
export async function requireRemark(
	asker: { locals: { person: SignedIn | null } },
	remarkId: string,
	action: ProgrammeAction
) {
	requirePerson(asker);
	const [found] = isUuid(remarkId)
		? await db.select().from(remark).where(eq(remark.id, remarkId))
		: [];
	if (!found) throw new Problem(404, 'There is no such remark on a note that you can read.');
	const { note, programme, person } = await requireNote(asker, found.noteId, action);
	return { remark: found, note, programme, person };
}
