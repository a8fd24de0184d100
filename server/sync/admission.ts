/** Who may open the socket of which note. Asked at the upgrade, and again whenever it may have changed. */
import { eq } from 'drizzle-orm';
import type { IncomingMessage } from 'node:http';
import { isUuid } from '$lib/server/auth/guard';
import { may, type Role } from '$lib/server/auth/permissions';
import { sessionFromCookie, type SignedIn } from '$lib/server/auth/sessions';
import { db } from '$lib/server/db';
import { note } from '$lib/server/db/schema';
import { roleIn } from '$lib/server/programmes/members';
import { settings } from '$lib/server/settings';
import { CLOSE } from '$lib/sync/close-codes';

export type Admitted = {
	noteId: string;
	programmeId: string;
	person: SignedIn;
	role: Role;
	/** The Cookie header, for asking again. */
	cookie: string | null;
};

const PATH = /^\/sync\/([^/?]+)(\?|$)/;

/** The note that a request is for; null when it is not for the sync server at all. */
export function noteAskedFor(request: IncomingMessage): string | null {
	return PATH.exec(request.url ?? '')?.[1] ?? null;
}

/**
 * Browsers send the cookie with a socket opened by any page; the Origin tells whose page it is. Attack
 * stopped here: another site's page reading and editing notes with the visitor's session.
 */
export function isOwnPage(request: IncomingMessage): boolean {
	return request.headers.origin === new URL(settings().ORIGIN).origin;
}

/** The admission, or the code to close with. */
export async function admit(noteId: string, cookie: string | null): Promise<Admitted | number> {
	const found = await sessionFromCookie(cookie);
	if (!found) return CLOSE.SIGNED_OUT;
	const { person } = found;
	if (!isUuid(noteId)) return CLOSE.NO_SUCH_NOTE;
	const [row] = await db
		.select({ programmeId: note.programmeId })
		.from(note)
		.where(eq(note.id, noteId));
	const role = row ? await roleIn(person.id, row.programmeId) : null;
	if (!row || role === null || !may(role, 'note.read')) return CLOSE.NO_SUCH_NOTE;
	return { noteId, programmeId: row.programmeId, person, role, cookie };
}
