/** What people are sent by mail, read from the queue; that it goes out from there is `mail.spec.ts`. */
import { sql } from 'drizzle-orm';
import { db } from '$lib/server/db';
import type { Mail } from '$lib/server/mail/mail';

/** Oldest first. */
export async function mailsTo(address: string): Promise<Mail[]> {
	const { rows } = await db.execute<{ data: Mail }>(
		sql`select data from jobs.job where name = 'mail' and data->>'to' = ${address}
			order by created_on`
	);
	return rows.map((row) => row.data);
}

/** The secret in the newest link of that kind to the address. */
export async function tokenMailedTo(
	address: string,
	kind: 'reset' | 'invitation'
): Promise<string> {
	const links = (await mailsTo(address)).map(
		(mail) => mail.text.match(new RegExp(`/${kind}/([\\w-]+)`))?.[1]
	);
	const token = links.findLast((link) => link !== undefined);
	if (!token) throw new Error(`No ${kind} was mailed to ${address}.`);
	return token;
}
