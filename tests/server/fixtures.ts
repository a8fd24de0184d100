/** People, programmes and notes for tests, inserted directly. */
import { hash } from '@node-rs/argon2';
import { randomUUID } from 'node:crypto';
import type { Role } from '$lib/server/auth/permissions';
import { startSession, type SignedIn } from '$lib/server/auth/sessions';
import { db } from '$lib/server/db';
import { gate, membership, note, noteSummary, programme, user } from '$lib/server/db/schema';

export const PASSWORD = 'a tape of many strands';

// As cheap as the algorithm allows: what is tested is never the strength of these hashes.
const passwordHash = hash(PASSWORD, {
	memoryCost: 8,
	timeCost: 1,
	parallelism: 1
});

let count = 0;

export async function makePerson(
	values: Partial<{ name: string; email: string; isAdministrator: boolean }> = {}
): Promise<SignedIn> {
	const [row] = await db
		.insert(user)
		.values({
			name: `P. Person ${++count}`,
			email: `person${count}@halden.example`,
			...values,
			passwordHash: await passwordHash
		})
		.returning();
	return {
		id: row!.id,
		email: row!.email,
		name: row!.name,
		isAdministrator: row!.isAdministrator
	};
}

/** A programme with one person in each role, or with those given. */
export async function makeProgramme(
	given: Partial<Record<Role, SignedIn>> = {},
	values: Partial<typeof programme.$inferInsert> = {}
) {
	const people = {
		lead: given.lead ?? (await makePerson()),
		engineer: given.engineer ?? (await makePerson()),
		reviewer: given.reviewer ?? (await makePerson()),
		observer: given.observer ?? (await makePerson())
	};
	const [row] = await db
		.insert(programme)
		.values({
			code: `T${++count}`,
			title: `Trial Line ${count}`,
			legalOwner: 'Halden Tether Works',
			createdBy: people.lead.id,
			...values
		})
		.returning();
	await db.insert(membership).values(
		Object.entries(people).map(([role, person]) => ({
			programmeId: row!.id,
			userId: person.id,
			role: role as Role
		}))
	);
	return { ...people, programme: row! };
}

export async function makeGate(
	programmeId: string,
	values: Partial<typeof gate.$inferInsert> = {}
) {
	const [row] = await db
		.insert(gate)
		.values({ programmeId, kind: 'PDR', name: 'Preliminary design review', position: 0, ...values })
		.returning();
	return row!;
}

/** A note without items: its document is empty. */
export async function makeNote(
	programmeId: string,
	creator: SignedIn,
	values: Partial<typeof note.$inferInsert> = {}
) {
	const [row] = await db
		.insert(note)
		.values({
			programmeId,
			number: `DN-${randomUUID().slice(0, 8)}`,
			title: 'Line sizing',
			creatorId: creator.id,
			...values
		})
		.returning();
	await db.insert(noteSummary).values({
		noteId: row!.id,
		seq: 0,
		checks: { holds: 0, thin: 0, fails: 0, waits: 0 },
		marks: [],
		itemCount: 0
	});
	return row!;
}

/** The Cookie header of a new session of the person. */
export async function cookieOf(person: SignedIn): Promise<string> {
	const { cookie } = await startSession(person.id);
	return `${cookie.name}=${cookie.value}`;
}
