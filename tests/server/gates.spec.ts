import { expect, test } from 'vitest';
import { db } from '$lib/server/db';
import { baseline } from '$lib/server/db/schema';
import { addGate, changeGate, gatesOf, moveGate, removeGate } from '$lib/server/gates/gates';
import { makeNote, makeProgramme } from './fixtures';

async function withGates(...kinds: string[]) {
	const made = await makeProgramme();
	for (const kind of kinds) await addGate(made.programme.id, { kind, name: kind, date: null });
	return { ...made, gates: await gatesOf(made.programme.id) };
}

const kindsOf = async (programmeId: string) => (await gatesOf(programmeId)).map((one) => one.kind);

test('gates stand in the order in which they were added', async () => {
	const { programme } = await withGates('SRR', 'PDR', 'CDR');
	expect(await kindsOf(programme.id)).toEqual(['SRR', 'PDR', 'CDR']);
});

test('a gate moves one place, and at the end of the line it stays', async () => {
	const { programme, gates } = await withGates('SRR', 'PDR', 'CDR');
	await moveGate(programme.id, gates[2]!.id, 'earlier');
	expect(await kindsOf(programme.id)).toEqual(['SRR', 'CDR', 'PDR']);
	await moveGate(programme.id, gates[1]!.id, 'later');
	expect(await kindsOf(programme.id)).toEqual(['SRR', 'CDR', 'PDR']);
});

test('a gate is changed and removed, and the rest close up', async () => {
	const { programme, gates } = await withGates('SRR', 'PDR', 'CDR');
	const values = { kind: 'PDR', name: 'Preliminary design review', date: '2027-05-24' };
	await changeGate(programme.id, gates[1]!.id, values);
	await removeGate(programme.id, gates[0]!.id);
	expect(await gatesOf(programme.id)).toMatchObject([
		{ ...values, position: 0 },
		{ kind: 'CDR', position: 1 }
	]);
});

test('a gate at which something was frozen stays, and says what', async () => {
	const { programme, lead, gates } = await withGates('SRR');
	const note = await makeNote(programme.id, lead, { number: 'T-DN-001' });
	await db.insert(baseline).values({
		noteId: note.id,
		revision: 'A',
		gateId: gates[0]!.id,
		seq: 0,
		state: new Uint8Array(),
		head: '{}',
		content: '{}',
		results: '[]',
		evidence: [],
		waivers: [],
		digest: '0'.repeat(64),
		engineVersion: '1',
		frozenBy: lead.id
	});
	expect(await gatesOf(programme.id)).toMatchObject([{ baselines: 1 }]);
	await expect(removeGate(programme.id, gates[0]!.id)).rejects.toThrow(
		'Frozen at this gate: T-DN-001 rev. A.'
	);
});

test('a gate of another programme is out of reach', async () => {
	const { gates } = await withGates('SRR');
	const other = await makeProgramme();
	const values = { kind: 'X', name: 'X', date: null };
	await expect(changeGate(other.programme.id, gates[0]!.id, values)).rejects.toMatchObject({
		status: 404
	});
	await expect(removeGate(other.programme.id, gates[0]!.id)).rejects.toMatchObject({
		status: 404
	});
});

test('gates added at once each get a place of their own', async () => {
	const { programme } = await makeProgramme();
	const kinds = ['SRR', 'PDR', 'CDR', 'QR'];
	await Promise.all(kinds.map((kind) => addGate(programme.id, { kind, name: kind, date: null })));
	expect((await gatesOf(programme.id)).map((one) => one.position)).toEqual([0, 1, 2, 3]);
});
