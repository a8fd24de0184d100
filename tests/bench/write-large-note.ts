/** Writes the large note into a programme of the site that the environment names, and prints its number. */
import { eq } from 'drizzle-orm';
import { db, pool } from '$lib/server/db';
import { programme, user } from '$lib/server/db/schema';
import { closeEngine } from '$lib/server/engine/evaluate';
import { createNote } from '$lib/server/notes/create';
import { fillNote } from '$lib/server/notes/edit';
import { largeNote } from './large-note';

const [code, email] = process.argv.slice(2);
const [line] = await db.select().from(programme).where(eq(programme.code, code!));
const [person] = await db.select().from(user).where(eq(user.email, email!));
const note = await createNote(line!, person!.id, { title: 'Large note for measuring' });
await fillNote(note.id, person!.id, largeNote());
console.log(note.number);
await closeEngine();
await pool.end();
