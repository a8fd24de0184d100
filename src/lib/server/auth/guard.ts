/**
 * What a route asks before it does anything. Somebody who is not in a programme is told that there is
 * none (404), so that nothing shows which exist; somebody who is in it and may not is told so (403).
 */
import { and, eq } from 'drizzle-orm';
import { z } from 'zod';
import { db } from '../db';
import { note, programme } from '../db/schema';
import { Problem } from '../problems';
import { roleIn } from '../programmes/members';
import { may, mayOnSite, type ProgrammeAction, type Role, type SiteAction } from './permissions';
import type { SignedIn } from './sessions';

export type Programme = typeof programme.$inferSelect;
export type Note = typeof note.$inferSelect;

type Asker = { locals: { person: SignedIn | null } };
type Granted = { person: SignedIn; programme: Programme; role: Role };

export function requirePerson({ locals }: Asker): SignedIn {
	if (!locals.person) throw new Problem(401, 'You are not signed in, or no longer.');
	return locals.person;
}

export function requireAdministrator(asker: Asker, action: SiteAction): SignedIn {
	const person = requirePerson(asker);
	if (!mayOnSite(person, action))
		throw new Problem(403, 'This is for the administrator of the site.');
	return person;
}

/** The programme with a code, for somebody who may take the action in it. */
export async function requireProgramme(
	asker: Asker,
	code: string,
	action: ProgrammeAction
): Promise<Granted> {
	const person = requirePerson(asker);
	const [found] = await db.select().from(programme).where(eq(programme.code, code));
	return grant(person, found, action, `There is no programme ${code} that you are in.`);
}

/** The note with an id, for somebody who may take the action in its programme. */
export async function requireNote(
	asker: Asker,
	noteId: string,
	action: ProgrammeAction
): Promise<Granted & { note: Note }> {
	return requireOne(asker, isUuid(noteId) ? eq(note.id, noteId) : undefined, action);
}

/** The note with a number in the programme with a code, as in the address of its page. */
export async function requireNoteNumbered(
	asker: Asker,
	code: string,
	number: string,
	action: ProgrammeAction
): Promise<Granted & { note: Note }> {
	return requireOne(asker, and(eq(programme.code, code), eq(note.number, number)), action);
}

async function requireOne(
	asker: Asker,
	which: ReturnType<typeof and>,
	action: ProgrammeAction
): Promise<Granted & { note: Note }> {
	const person = requirePerson(asker);
	const [found] = which
		? await db
				.select({ note, programme })
				.from(note)
				.innerJoin(programme, eq(programme.id, note.programmeId))
				.where(which)
		: [];
	const granted = await grant(
		person,
		found?.programme,
		action,
		'There is no such note in a programme that you are in.'
	);
	return { ...granted, note: found!.note };
}

async function grant(
	person: SignedIn,
	found: Programme | undefined,
	action: ProgrammeAction,
	missing: string
): Promise<Granted> {
	const role = found ? await roleIn(person.id, found.id) : null;
	if (!found || role === null) throw new Problem(404, missing);
	if (!may(role, action)) throw new Problem(403, refusal(role, action, found));
	return { person, programme: found, role };
}

function refusal(role: Role, action: ProgrammeAction, { title }: Programme): string {
	return `You are ${role} in ${title}; that role does not include this (${action}). A lead of the programme can change it.`;
}

/** Asked before an id from outside reaches the database, which would answer with an error. */
export const isUuid = (text: string) => z.guid().safeParse(text).success;
