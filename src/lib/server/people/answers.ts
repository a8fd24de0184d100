/** What somebody who was invited answers. */
import { eq } from 'drizzle-orm';
import { hashPassword } from '../auth/passwords';
import { startSession, type SessionCookie, type SignedIn } from '../auth/sessions';
import { db, type Db } from '../db';
import { invitation, membership, user } from '../db/schema';
import { announce } from '../events';
import { queueMail } from '../mail/queue';
import { Problem } from '../problems';
import { openInvitation } from './invitations';

/** Whether the address of an invitation has an account: its holder then signs in to accept. */
export async function hasAccount(email: string): Promise<boolean> {
	const rows = await db.select({ id: user.id }).from(user).where(eq(user.email, email));
	return rows.length > 0;
}

/** Makes an account for the invited address and enters the programme with it. */
export async function acceptAsNew(
	token: string,
	person: { name: string; password: string }
): Promise<{ code: string; cookie: SessionCookie }> {
	const passwordHash = await hashPassword(person.password);
	const { code, userId } = await db.transaction(async (tx) => {
		const found = await lockInvitation(tx, token);
		const [made] = await tx
			.insert(user)
			.values({ email: found.email, name: person.name, passwordHash })
			.onConflictDoNothing({ target: user.email })
			.returning({ id: user.id });
		if (!made)
			throw new Problem(409, `${found.email} has an account by now: sign in, then accept.`);
		await enter(tx, found, made.id);
		return { code: found.programme.code, userId: made.id };
	});
	return { code, cookie: (await startSession(userId)).cookie };
}

/** Enters the programme with the account of the invited address; the answer is the programme's code. */
export async function acceptAs(token: string, person: SignedIn): Promise<string> {
	return db.transaction(async (tx) => {
		const found = await lockInvitation(tx, token);
		if (found.email !== person.email)
			throw new Problem(403, `This invitation is for ${found.email}, not for ${person.email}.`);
		await enter(tx, found, person.id);
		return found.programme.code;
	});
}

type Found = NonNullable<Awaited<ReturnType<typeof openInvitation>>>;

/** Two answers at once: the second waits here and then finds the link used. */
async function lockInvitation(tx: Db, token: string): Promise<Found> {
	const found = await openInvitation(tx, token);
	if (found) {
		await tx.select().from(invitation).where(eq(invitation.id, found.id)).for('update');
		if (await openInvitation(tx, token)) return found;
	}
	throw new Problem(409, 'This invitation was answered or withdrawn, or it has lapsed.');
}

async function enter(tx: Db, found: Found, userId: string): Promise<void> {
	await tx.update(invitation).set({ acceptedAt: new Date() }).where(eq(invitation.id, found.id));
	await tx
		.insert(membership)
		.values({
			programmeId: found.programme.id,
			userId,
			role: found.role,
			field: found.field
		})
		.onConflictDoNothing();
	await announce(tx, { kind: 'people', programmeId: found.programme.id });
}

export async function decline(token: string): Promise<void> {
	await db.transaction(async (tx) => {
		const found = await lockInvitation(tx, token);
		await tx.update(invitation).set({ declinedAt: new Date() }).where(eq(invitation.id, found.id));
		await queueMail(tx, {
			to: found.inviter.email,
			subject: `Declined: invitation to ${found.programme.title}`,
			text: `${found.email} declined your invitation to ${found.programme.title} as ${found.role}.`
		});
	});
}
