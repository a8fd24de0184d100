import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { sessionFromCookie } from '$lib/server/auth/sessions';
import { db } from '$lib/server/db';
import { checkMovement, noteItem, session, user } from '$lib/server/db/schema';
import { today } from '$lib/server/programmes/today';
import { cookieOf, makeGate, makeNote, makePerson, makeProgramme } from './fixtures';

const ago = (minutes: number) => new Date(Date.now() - minutes * 60_000);

async function withMovement(movedAt: Date) {
	const team = await makeProgramme();
	const note = await makeNote(team.programme.id, team.engineer, { number: 'T-DN-004' });
	const key = { noteId: note.id, itemId: 'c' };
	await db.insert(noteItem).values({ ...key, kind: 'check', number: '4.2', description: 'Stress' });
	await db.insert(checkMovement).values({
		...key,
		...{ stateBefore: 'holds', state: 'fails' },
		...{ movedBy: team.engineer.id, movedAt }
	});
	return team;
}

const lastVisit = (userId: string, at: Date) =>
	db.update(user).set({ lastVisitEndedAt: at }).where(eq(user.id, userId));

test('a check that somebody moved since the last visit is news', async () => {
	const { lead, engineer } = await withMovement(ago(10));
	await lastVisit(lead.id, ago(60));
	expect((await today(lead.id)).moved.checks).toMatchObject([
		{ noteNumber: 'T-DN-004', number: '4.2', stateBefore: 'holds', state: 'fails' }
	]);
	expect((await today(lead.id)).moved.checks[0]!.movedBy).toBe(engineer.name);
});

test('what moved before, or by oneself, or in a programme of others is none', async () => {
	const { lead, engineer } = await withMovement(ago(90));
	await lastVisit(lead.id, ago(60));
	await lastVisit(engineer.id, ago(120));
	const stranger = await makePerson();
	await lastVisit(stranger.id, ago(120));
	for (const one of [lead, engineer, stranger])
		expect((await today(one.id)).moved.checks).toEqual([]);
});

test('a visit ends when half an hour passes without use', async () => {
	const person = await makePerson();
	const cookie = await cookieOf(person);
	const lastUse = ago(31);
	await db.update(user).set({ lastHereAt: lastUse }).where(eq(user.id, person.id));
	await db.update(session).set({ expiresAt: new Date(Date.now() + 11 * 3_600_000) });
	await sessionFromCookie(cookie);
	expect((await today(person.id)).moved.since).toBe(lastUse.toISOString());
});

test('programmes stand with their gates and notes, and only those that one is in', async () => {
	const { programme, observer } = await makeProgramme();
	await makeGate(programme.id, { kind: 'SRR' });
	const { programmes } = await today(observer.id);
	expect(programmes).toMatchObject([
		{ code: programme.code, role: 'observer', gates: [{ kind: 'SRR', baselines: 0 }], notes: [] }
	]);
});
