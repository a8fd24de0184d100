/**
 * Invitations into a programme: a link by mail that works once and lapses after seven days. Whoever
 * opens it has the mailbox it was sent to; only the account of that address can accept it.
 *
 * open → accepted (by the person) | declined (by the person) | withdrawn (by a lead) | lapsed (in time)
 */
import { and, desc, eq, gt, isNull } from 'drizzle-orm';
import { db, type Db } from '../db';
import { invitation, membership, programme, user } from '../db/schema';
import { queueMail } from '../mail/queue';
import { Problem } from '../problems';
import { settings } from '../settings';
import type { Role } from '../auth/permissions';
import type { SignedIn } from '../auth/sessions';
import { digestOf, newToken } from '../auth/tokens';

const DAYS = 7;

type Invited = { email: string; role: Role; field: string; message: string };
type InProgramme = { id: string; title: string };

const isOpen = () =>
	and(
		isNull(invitation.acceptedAt),
		isNull(invitation.declinedAt),
		isNull(invitation.withdrawnAt),
		gt(invitation.expiresAt, new Date())
	);

export async function invite(by: SignedIn, into: InProgramme, invited: Invited): Promise<void> {
	await db.transaction((tx) => inviteIn(tx, by, into, invited));
}

/** As `invite`, in the caller's transaction. */
export async function inviteIn(
	tx: Db,
	by: SignedIn,
	into: InProgramme,
	invited: Invited
): Promise<void> {
	await refuseMember(tx, into, invited.email);
	// A second invitation takes the place of the first: one link is open at a time.
	await tx
		.update(invitation)
		.set({ withdrawnAt: new Date() })
		.where(and(eq(invitation.programmeId, into.id), eq(invitation.email, invited.email), isOpen()));
	const { token, hash } = newToken();
	const values = { ...invited, programmeId: into.id, invitedBy: by.id, tokenHash: hash };
	await tx.insert(invitation).values({ ...values, expiresAt: lapse() });
	await sendInvitation(tx, by, into, invited, token);
}

async function refuseMember(tx: Db, into: InProgramme, email: string): Promise<void> {
	const [member] = await tx
		.select({ name: user.name, role: membership.role })
		.from(membership)
		.innerJoin(user, eq(user.id, membership.userId))
		.where(and(eq(membership.programmeId, into.id), eq(user.email, email)));
	if (member)
		throw new Problem(409, `${member.name} is in ${into.title} already, as ${member.role}.`);
}

/** Sends an open or lapsed invitation once more, with a new link and seven more days. */
export async function inviteAgain(by: SignedIn, into: InProgramme, id: string): Promise<void> {
	await db.transaction(async (tx) => {
		const { token, hash } = newToken();
		const [row] = await tx
			.update(invitation)
			.set({ tokenHash: hash, invitedBy: by.id, expiresAt: lapse() })
			.where(and(eq(invitation.id, id), eq(invitation.programmeId, into.id), isWaiting()))
			.returning();
		if (!row) throw new Problem(409, 'This invitation does not wait for an answer any more.');
		await sendInvitation(tx, by, into, row, token);
	});
}

export async function withdrawInvitation(programmeId: string, id: string): Promise<void> {
	const [row] = await db
		.update(invitation)
		.set({ withdrawnAt: new Date() })
		.where(and(eq(invitation.id, id), eq(invitation.programmeId, programmeId), isWaiting()))
		.returning();
	if (!row) throw new Problem(409, 'This invitation does not wait for an answer any more.');
}

/** Not answered and not withdrawn; it may have lapsed. */
const isWaiting = () =>
	and(isNull(invitation.acceptedAt), isNull(invitation.declinedAt), isNull(invitation.withdrawnAt));

/** Invitations of a programme that wait for an answer, newest first. */
export function invitationsOf(programmeId: string) {
	return db
		.select({
			id: invitation.id,
			email: invitation.email,
			role: invitation.role,
			field: invitation.field,
			invitedBy: user.name,
			createdAt: invitation.createdAt,
			expiresAt: invitation.expiresAt
		})
		.from(invitation)
		.innerJoin(user, eq(user.id, invitation.invitedBy))
		.where(and(eq(invitation.programmeId, programmeId), isWaiting()))
		.orderBy(desc(invitation.createdAt));
}

/** The invitation that a link opens; null when it was answered, withdrawn, has lapsed or never was. */
export async function openInvitation(tx: Db, token: string) {
	const [found] = await tx
		.select({
			id: invitation.id,
			email: invitation.email,
			role: invitation.role,
			field: invitation.field,
			message: invitation.message,
			createdAt: invitation.createdAt,
			expiresAt: invitation.expiresAt,
			programme: { id: programme.id, code: programme.code, title: programme.title },
			inviter: { name: user.name, email: user.email }
		})
		.from(invitation)
		.innerJoin(programme, eq(programme.id, invitation.programmeId))
		.innerJoin(user, eq(user.id, invitation.invitedBy))
		.where(and(eq(invitation.tokenHash, digestOf(token)), isOpen()));
	return found ?? null;
}

function lapse(): Date {
	return new Date(Date.now() + DAYS * 86_400_000);
}

async function sendInvitation(
	tx: Db,
	by: SignedIn,
	into: InProgramme,
	invited: Invited,
	token: string
): Promise<void> {
	await queueMail(tx, {
		to: invited.email,
		subject: `Invitation to ${into.title}`,
		text: [
			`${by.name} invites you to ${into.title} on Holdfast, as ${invited.role}.`,
			...(invited.message ? [`${by.name} writes: “${invited.message}”`] : []),
			`${settings().ORIGIN}/invitation/${token}`,
			`The link works once and lapses after ${DAYS} days. To decline, open it too; to do nothing is no answer.`
		].join('\n\n')
	});
}
