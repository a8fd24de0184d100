import { and, eq, ne } from 'drizzle-orm';
import type { Note, Programme } from '../auth/guard';
import type { SignedIn } from '../auth/sessions';
import type { Db } from '../db';
import { membership, user, type baseline, type gate } from '../db/schema';
import { queueMail } from '../mail/queue';
import { settings } from '../settings';
import { groupedDigest } from '$lib/components/baseline/digest';

type News = {
	note: Note;
	programme: Programme;
	person: SignedIn;
	gate: typeof gate.$inferSelect;
	row: typeof baseline.$inferInsert & { id: string };
};

/** Everybody in the programme but the one who froze. */
export async function tellTeam(tx: Db, { note, programme, person, gate, row }: News) {
	const team = await tx
		.select({ email: user.email })
		.from(membership)
		.innerJoin(user, eq(user.id, membership.userId))
		.where(and(eq(membership.programmeId, programme.id), ne(user.id, person.id)));
	const waived = row.waivers.length;
	const text = [
		`${programme.title}, ${note.number} ${note.title}`,
		`${person.name} froze baseline ${row.revision} at ${gate.kind}, ${gate.name}.`,
		`SHA-256 ${groupedDigest(row.digest)}`,
		...(waived > 0
			? [`Failing checks let through by waiver: ${waived}. The sheet says which.`]
			: []),
		'',
		`The sheet: ${settings().ORIGIN}/programmes/${programme.code}/baselines/${row.id}`
	].join('\n');
	for (const { email } of team) {
		const subject = `${note.number}: baseline ${row.revision} frozen at ${gate.kind}`;
		await queueMail(tx, { to: email, subject, text });
	}
}
