import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { sessionFromCookie } from '$lib/server/auth/sessions';
import { signIn } from '$lib/server/auth/sign-in';
import { db } from '$lib/server/db';
import { invitation, user } from '$lib/server/db/schema';
import { acceptAs, acceptAsNew, decline } from '$lib/server/people/answers';
import {
	invitationsOf,
	invite,
	inviteAgain,
	openInvitation,
	withdrawInvitation
} from '$lib/server/people/invitations';
import { roleIn } from '$lib/server/programmes/members';
import { makePerson, makeProgramme, PASSWORD } from './fixtures';
import { mailsTo, tokenMailedTo } from './mailed';

let count = 0;
const newAddress = () => `invited${++count}@kelda.example`;

async function invited(email = newAddress()) {
	const { programme, lead } = await makeProgramme();
	const values = { email, role: 'reviewer' as const, field: 'debris', message: 'For the flux.' };
	await invite(lead, programme, values);
	return { programme, lead, email, token: await tokenMailedTo(email, 'invitation') };
}

const WITH = { name: 'C. Ferrand', password: 'seven braids in the wind' };

test('the mail names who invites, into what, as what, and what they write', async () => {
	const { email, lead, programme } = await invited();
	const [mail] = await mailsTo(email);
	expect(mail!.subject).toBe(`Invitation to ${programme.title}`);
	for (const part of [lead.name, programme.title, 'as reviewer', 'For the flux.'])
		expect(mail!.text).toContain(part);
});

test('somebody new accepts with a name and a password and is in', async () => {
	const { email, token, programme } = await invited();
	const { code, cookie } = await acceptAsNew(token, WITH);
	expect(code).toBe(programme.code);
	const found = await sessionFromCookie(`${cookie.name}=${cookie.value}`);
	expect(found?.person).toMatchObject({ email, name: 'C. Ferrand', isAdministrator: false });
	expect(await roleIn(found!.person.id, programme.id)).toBe('reviewer');
	expect((await signIn(email, WITH.password, '192.0.2.1')).outcome).toBe('in');
});

test('an invitation is accepted once, also when two accept at the same moment', async () => {
	const { email, token } = await invited();
	const both = await Promise.allSettled([acceptAsNew(token, WITH), acceptAsNew(token, WITH)]);
	expect(both.map((one) => one.status).sort()).toEqual(['fulfilled', 'rejected']);
	await expect(acceptAsNew(token, WITH)).rejects.toMatchObject({ status: 409 });
	expect(await db.select().from(user).where(eq(user.email, email))).toHaveLength(1);
});

test('somebody with an account accepts with it, and their password stays', async () => {
	const person = await makePerson();
	const { token, programme } = await invited(person.email);
	await expect(acceptAsNew(token, WITH)).rejects.toMatchObject({ status: 409 });
	expect(await acceptAs(token, person)).toBe(programme.code);
	expect(await roleIn(person.id, programme.id)).toBe('reviewer');
	expect((await signIn(person.email, PASSWORD, '192.0.2.1')).outcome).toBe('in');
});

test('nobody accepts an invitation that is for somebody else', async () => {
	const { token, programme } = await invited();
	const other = await makePerson();
	await expect(acceptAs(token, other)).rejects.toMatchObject({ status: 403 });
	expect(await roleIn(other.id, programme.id)).toBeNull();
});

test('declining is told to who invited, and the link is used up', async () => {
	const { email, token, lead } = await invited();
	await decline(token);
	expect((await mailsTo(lead.email))[0]?.text).toContain(email);
	await expect(acceptAsNew(token, WITH)).rejects.toMatchObject({ status: 409 });
});

test('an invitation that was withdrawn opens nothing', async () => {
	const { token, programme } = await invited();
	const [row] = await invitationsOf(programme.id);
	await withdrawInvitation(programme.id, row!.id);
	expect(await openInvitation(db, token)).toBeNull();
	expect(await invitationsOf(programme.id)).toEqual([]);
	await expect(acceptAsNew(token, WITH)).rejects.toMatchObject({ status: 409 });
});

test('an invitation lapses after seven days and can be sent again, with a new link', async () => {
	const { email, token, programme, lead } = await invited();
	const [row] = await invitationsOf(programme.id);
	const days = (row!.expiresAt.getTime() - Date.now()) / 86_400_000;
	expect(days).toBeGreaterThan(6.9);
	expect(days).toBeLessThanOrEqual(7);
	await db
		.update(invitation)
		.set({ expiresAt: new Date(Date.now() - 1) })
		.where(eq(invitation.id, row!.id));
	expect(await openInvitation(db, token)).toBeNull();

	await inviteAgain(lead, programme, row!.id);
	expect(await mailsTo(email)).toHaveLength(2);
	const second = await tokenMailedTo(email, 'invitation');
	expect(await openInvitation(db, token)).toBeNull();
	expect(await openInvitation(db, second)).toMatchObject({ email });
});

test('a second invitation to an address takes the place of the first', async () => {
	const { email, token, programme, lead } = await invited();
	await invite(lead, programme, { email, role: 'engineer', field: '', message: '' });
	expect(await openInvitation(db, token)).toBeNull();
	expect(await invitationsOf(programme.id)).toMatchObject([{ role: 'engineer' }]);
});

test('somebody who is in the programme is not invited again', async () => {
	const { programme, lead, engineer } = await makeProgramme();
	const again = { email: engineer.email, role: 'lead' as const, field: '', message: '' };
	await expect(invite(lead, programme, again)).rejects.toThrow(
		`${engineer.name} is in ${programme.title} already, as engineer.`
	);
});

test('an invitation of another programme cannot be touched', async () => {
	const { programme } = await invited();
	const other = await makeProgramme();
	const [row] = await invitationsOf(programme.id);
	await expect(withdrawInvitation(other.programme.id, row!.id)).rejects.toMatchObject({
		status: 409
	});
	await expect(inviteAgain(other.lead, other.programme, row!.id)).rejects.toMatchObject({
		status: 409
	});
});
