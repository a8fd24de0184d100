import { db } from '$lib/server/db';
import { gate, membership, programme, user } from '$lib/server/db/schema';
import { hashPassword } from '$lib/server/auth/passwords';
import type { SignedIn } from '$lib/server/auth/sessions';
import { cordillera } from './notes/cordillera';
import { mare } from './notes/mare';
import type { DemoProgramme } from './notes';
import { DEMO_PASSWORD, PEOPLE, address } from './people';
import { writeNote } from './write-note';

export type People = ReadonlyMap<string, SignedIn>;

const LEGAL_OWNER = 'Halden Tether Works';

export async function seed(): Promise<void> {
	const people = await writePeople();
	for (const demo of [cordillera, mare]) await writeProgramme(demo, people);
}

async function writePeople(): Promise<People> {
	const passwordHash = await hashPassword(DEMO_PASSWORD);
	const rows = await db
		.insert(user)
		.values(
			PEOPLE.map(({ key, name, administrator = false }) => ({
				email: address(key),
				name,
				passwordHash,
				isAdministrator: administrator
			}))
		)
		.returning();
	return new Map(rows.map((row) => [row.email.split('@')[0]!, row]));
}

async function writeProgramme(demo: DemoProgramme, people: People): Promise<void> {
	const { code, title, summary } = demo;
	const [row] = await db
		.insert(programme)
		.values({ code, title, summary, legalOwner: LEGAL_OWNER, createdBy: people.get('brandt')!.id })
		.returning();
	await db.insert(membership).values(
		PEOPLE.flatMap(({ key, roles }) => {
			const held = roles[code];
			return held ? [{ programmeId: row!.id, userId: people.get(key)!.id, ...held }] : [];
		})
	);
	const gates = await db
		.insert(gate)
		.values(
			demo.gates.map(({ kind, name, inDays }, position) => ({
				programmeId: row!.id,
				kind,
				name,
				date: dayFromNow(inDays),
				position
			}))
		)
		.returning();
	for (const note of demo.notes) await writeNote({ demo: note, programme: row!, gates, people });
}

function dayFromNow(days: number): string {
	const day = new Date();
	day.setUTCDate(day.getUTCDate() + days);
	return day.toISOString().slice(0, 10);
}
