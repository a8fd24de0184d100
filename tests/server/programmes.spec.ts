import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { invitationsOf } from '$lib/server/people/invitations';
import { changeMember, createProgramme, removeMember } from '$lib/server/programmes/changes';
import { membersOf, programmesOf, roleIn } from '$lib/server/programmes/members';
import { db } from '$lib/server/db';
import { programme } from '$lib/server/db/schema';
import { makePerson, makeProgramme } from './fixtures';
import { mailsTo, tokenMailedTo } from './mailed';

const NEW = {
	code: 'NL',
	title: 'Northern Line',
	summary: '',
	legalOwner: 'Halden Tether Works',
	leadEmail: 'first@halden.example'
};

test('an administrator creates a programme and its first lead is invited', async () => {
	const administrator = await makePerson({ isAdministrator: true });
	await createProgramme(administrator, NEW);
	await tokenMailedTo('first@halden.example', 'invitation');
	const [made] = await db.select().from(programme).where(eq(programme.code, 'NL'));
	expect(await invitationsOf(made!.id)).toMatchObject([{ role: 'lead' }]);
	// Creating it gives no place in it.
	expect(await roleIn(administrator.id, made!.id)).toBeNull();
});

test('a code is given once, and a refused creation invites nobody', async () => {
	const administrator = await makePerson({ isAdministrator: true });
	const again = { ...NEW, code: 'TW', leadEmail: 'second@halden.example' };
	await createProgramme(administrator, again);
	await tokenMailedTo('second@halden.example', 'invitation');
	const third = { ...again, leadEmail: 'third@halden.example' };
	await expect(createProgramme(administrator, third)).rejects.toThrow(
		'There is a programme TW already.'
	);
	expect(await mailsTo('third@halden.example')).toEqual([]);
});

test('a lead sets roles and fields', async () => {
	const { programme, reviewer } = await makeProgramme();
	await changeMember(programme.id, reviewer.id, { role: 'engineer', field: 'dynamics' });
	expect((await membersOf(programme.id)).find((one) => one.userId === reviewer.id)).toMatchObject({
		role: 'engineer',
		field: 'dynamics'
	});
});

test('the last lead is neither demoted nor removed', async () => {
	const { programme, lead } = await makeProgramme();
	const words = 'A programme keeps one lead';
	await expect(
		changeMember(programme.id, lead.id, { role: 'engineer', field: '' })
	).rejects.toThrow(words);
	await expect(removeMember(lead, programme, lead.id)).rejects.toThrow(words);
	expect(await roleIn(lead.id, programme.id)).toBe('lead');
});

test('of two leads who demote one another at once, one stays', async () => {
	const { programme, lead, engineer } = await makeProgramme();
	await changeMember(programme.id, engineer.id, { role: 'lead', field: '' });
	const both = await Promise.allSettled(
		[lead, engineer].map((one) =>
			changeMember(programme.id, one.id, { role: 'observer', field: '' })
		)
	);
	expect(both.map((one) => one.status).sort()).toEqual(['fulfilled', 'rejected']);
	const leads = (await membersOf(programme.id)).filter((one) => one.role === 'lead');
	expect(leads).toHaveLength(1);
});

test('somebody removed is out and is told by whom', async () => {
	const { programme, lead, observer } = await makeProgramme();
	await removeMember(lead, programme, observer.id);
	expect(await roleIn(observer.id, programme.id)).toBeNull();
	expect(await programmesOf(observer.id)).toEqual([]);
	expect((await mailsTo(observer.email))[0]?.text).toContain(lead.name);
});

test('nobody is changed or removed who is not in the programme', async () => {
	const { programme, lead } = await makeProgramme();
	const stranger = await makePerson();
	const change = changeMember(programme.id, stranger.id, { role: 'lead', field: '' });
	await expect(change).rejects.toMatchObject({ status: 404 });
	await expect(removeMember(lead, programme, stranger.id)).rejects.toMatchObject({ status: 404 });
});
