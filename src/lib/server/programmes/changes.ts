/** What an administrator and a lead change about a programme and the people in it. */
import { and, eq, ne, sql } from 'drizzle-orm';
import type { Role } from '../auth/permissions';
import type { SignedIn } from '../auth/sessions';
import { db, type Db } from '../db';
import { membership, programme, user } from '../db/schema';
import { announce } from '../events';
import { queueMail } from '../mail/queue';
import { inviteIn } from '../people/invitations';
import { Problem } from '../problems';

type NewProgramme = {
	code: string;
	title: string;
	summary: string;
	legalOwner: string;
	leadEmail: string;
};

/** Creates a programme and invites its first lead. */
export async function createProgramme(by: SignedIn, values: NewProgramme): Promise<void> {
	const { leadEmail, ...head } = values;
	await db.transaction(async (tx) => {
		const [made] = await tx
			.insert(programme)
			.values({ ...head, createdBy: by.id })
			.onConflictDoNothing({ target: programme.code })
			.returning();
		if (!made) throw new Problem(409, `There is a programme ${head.code} already.`);
		const invited = { email: leadEmail, role: 'lead' as const, field: '', message: '' };
		await inviteIn(tx, by, made, invited);
	});
}

export async function changeProgramme(
	id: string,
	values: { title: string; summary: string }
): Promise<void> {
	await db.transaction(async (tx) => {
		await tx.update(programme).set(values).where(eq(programme.id, id));
		await announce(tx, { kind: 'note', programmeId: id });
	});
}

export async function changeMember(
	programmeId: string,
	userId: string,
	values: { role: Role; field: string }
): Promise<void> {
	await db.transaction(async (tx) => {
		if (values.role !== 'lead') await keepOneLead(tx, programmeId, userId);
		const [row] = await tx
			.update(membership)
			.set(values)
			.where(and(eq(membership.programmeId, programmeId), eq(membership.userId, userId)))
			.returning();
		if (!row) throw new Problem(404, 'This person is not in the programme, or no longer.');
		await announce(tx, { kind: 'access', programmeId, userId });
	});
}

/** Ends somebody's place in a programme; what they wrote and signed stays under their name. */
export async function removeMember(
	by: SignedIn,
	{ id, title }: { id: string; title: string },
	userId: string
): Promise<void> {
	await db.transaction(async (tx) => {
		await keepOneLead(tx, id, userId);
		const [row] = await tx
			.delete(membership)
			.where(and(eq(membership.programmeId, id), eq(membership.userId, userId)))
			.returning();
		if (!row) throw new Problem(404, 'This person is not in the programme, or no longer.');
		await announce(tx, { kind: 'access', programmeId: id, userId });
		const [person] = await tx.select().from(user).where(eq(user.id, userId));
		await queueMail(tx, {
			to: person!.email,
			subject: `Your place in ${title} has ended`,
			text: `${by.name} ended your place in ${title}. What you wrote and signed stays under your name.\n\nA mistake? Write to ${by.name}, ${by.email}.`
		});
	});
}

/** Two leads who demote one another at once: the lock makes one of them the last. */
async function keepOneLead(tx: Db, programmeId: string, userId: string): Promise<void> {
	await tx.select().from(programme).where(eq(programme.id, programmeId)).for('update');
	const [others] = await tx
		.select({ count: sql<number>`count(*)::int` })
		.from(membership)
		.where(
			and(
				eq(membership.programmeId, programmeId),
				eq(membership.role, 'lead'),
				ne(membership.userId, userId)
			)
		);
	if (others!.count === 0)
		throw new Problem(409, 'A programme keeps one lead: make somebody else lead first.');
}
