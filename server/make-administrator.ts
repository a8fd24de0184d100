/**
 * `npm run make-administrator -- <address> "<name>"`: makes somebody administrator of the site, with an
 * account if they have none. A new site begins with this; everybody else comes by invitation.
 */
import { randomBytes } from 'node:crypto';
import { z } from 'zod';
import { hashPassword } from '$lib/server/auth/passwords';
import { makeLink } from '$lib/server/auth/resets';
import { db, pool } from '$lib/server/db';
import { user } from '$lib/server/db/schema';
import { personNameSchema } from '$lib/server/people/names';

const MINUTES = 60;

const addressSchema = z.email('That is no e-mail address.').max(254).toLowerCase();

async function main(words: string[]): Promise<void> {
	if (words.length !== 2) throw new Error('Give an e-mail address and a name in quotes.');
	const email = addressSchema.parse(words[0]);
	const name = personNameSchema.parse(words[1]);
	// Nobody knows this password: the link sets the first one.
	const passwordHash = await hashPassword(randomBytes(32).toString('base64url'));
	const link = await db.transaction(async (tx) => {
		const [row] = await tx
			.insert(user)
			.values({ email, name, passwordHash, isAdministrator: true })
			.onConflictDoUpdate({ target: user.email, set: { isAdministrator: true } })
			.returning();
		return makeLink(tx, row!.id, MINUTES);
	});
	console.log(
		`${email} is administrator. A password is set here, once, within ${MINUTES} minutes:`
	);
	console.log(link);
}

try {
	await main(process.argv.slice(2));
} catch (error) {
	const said = error instanceof z.ZodError ? z.prettifyError(error) : (error as Error).message;
	console.error(said);
	process.exitCode = 1;
}
await pool.end();
