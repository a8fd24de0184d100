/**
 * Freezing a note at a gate.
 *
 * The document is read and computed at its newest committed update before the transaction, so that
 * nobody's typing waits for the engine. The transaction then locks the note's row and goes on only if
 * the note is still at the revision that the lead means and at the update that the lead looked at: two
 * leads who freeze at once get one baseline and one refusal, and nothing is frozen unseen.
 */
import { and, asc, eq, gt } from 'drizzle-orm';
import { canonicalJson } from '$lib/note/canonical';
import { ENGINE_VERSION } from '$lib/engine/version';
import type { Note, Programme } from '../auth/guard';
import type { SignedIn } from '../auth/sessions';
import { db, type Db } from '../db';
import { baseline, baselineEvidence, gate, note as noteTable } from '../db/schema';
import { announce } from '../events';
import { Problem } from '../problems';
import { candidateOf, type Candidate } from './candidate';
import { digestOf } from './digest';
import type { BaselineHead } from './head';
import type { FreezeInput } from './input';
import { namesOf, summaryOf } from './title-block';
import { nextRevision } from './revision';
import { tellTeam } from './tell-team';
import { requireFree } from './waivers';

type Freeze = { note: Note; programme: Programme; person: SignedIn; input: FreezeInput };

/** Returns the id of the new baseline. */
export async function freeze({ note, programme, person, input }: Freeze): Promise<string> {
	const candidate = await candidateOf(note);
	requireUnmoved(note, input, note.revision, candidate.seq);
	requireFree(note, candidate, input.waivers);
	return db.transaction(async (tx) => {
		const [locked] = await tx
			.select()
			.from(noteTable)
			.where(eq(noteTable.id, note.id))
			.for('update');
		if (!locked) throw new Problem(404, `${note.number} is there no longer.`);
		requireUnmoved(locked, input, locked.revision, locked.seq);
		const [at] = await tx
			.select()
			.from(gate)
			.where(and(eq(gate.id, input.gateId), eq(gate.programmeId, programme.id)));
		if (!at) throw new Problem(422, `${programme.title} has no such gate.`);

		const row = await sealed(tx, { note: locked, programme, person, input }, at, candidate);
		await tx.insert(baseline).values(row);
		if (row.evidence.length > 0) {
			const files = row.evidence.map(({ fileId }) => ({ baselineId: row.id, fileId }));
			await tx.insert(baselineEvidence).values(files);
		}
		await openNext(tx, locked, at);
		await tellTeam(tx, { note: locked, programme, person, gate: at, row });
		await announce(tx, { kind: 'baselines', noteId: note.id });
		await announce(tx, { kind: 'note', noteId: note.id });
		return row.id;
	});
}

function requireUnmoved(note: Note, input: FreezeInput, revision: string, seq: number): void {
	if (revision !== input.revision) {
		throw new Problem(
			409,
			`${note.number} revision ${input.revision} is frozen already; the note is at revision ${revision} now.`,
			{ revision }
		);
	}
	if (seq !== input.seenSeq) {
		throw new Problem(
			409,
			`${note.number} has moved on since you looked: you saw edit ${input.seenSeq}, it is at edit ${seq} now. Look at it again, then freeze.`,
			{ seq }
		);
	}
}

async function sealed(
	tx: Db,
	{ note, programme, person, input }: Freeze,
	at: typeof gate.$inferSelect,
	candidate: Candidate
) {
	const frozenAt = new Date();
	const { creator, approver } = await namesOf(tx, note);
	const head: BaselineHead = {
		format: 'holdfast-baseline',
		version: 1,
		note: {
			id: note.id,
			number: note.number,
			title: note.title,
			department: note.department,
			technicalReference: note.technicalReference,
			creator,
			approver
		},
		programme: {
			code: programme.code,
			title: programme.title,
			legalOwner: programme.legalOwner
		},
		revision: note.revision,
		gate: { id: at.id, kind: at.kind, name: at.name },
		seq: candidate.seq,
		frozenBy: { id: person.id, name: person.name },
		frozenAt: frozenAt.toISOString(),
		engineVersion: ENGINE_VERSION,
		...summaryOf(candidate.content, candidate.results)
	};
	const texts = {
		head: canonicalJson(head),
		content: canonicalJson(candidate.content),
		results: canonicalJson(candidate.results),
		evidence: canonicalJson(candidate.evidence),
		waivers: canonicalJson(input.waivers)
	};
	return {
		id: crypto.randomUUID(),
		noteId: note.id,
		revision: note.revision,
		gateId: at.id,
		seq: candidate.seq,
		state: candidate.state,
		head: texts.head,
		content: texts.content,
		results: texts.results,
		evidence: candidate.evidence,
		waivers: input.waivers,
		digest: digestOf(texts),
		engineVersion: ENGINE_VERSION,
		frozenBy: person.id,
		frozenAt
	};
}

/** Work goes on in the next revision, written for the gate after this one. */
async function openNext(tx: Db, note: Note, at: typeof gate.$inferSelect): Promise<void> {
	const [next] = await tx
		.select({ id: gate.id })
		.from(gate)
		.where(and(eq(gate.programmeId, note.programmeId), gt(gate.position, at.position)))
		.orderBy(asc(gate.position))
		.limit(1);
	await tx
		.update(noteTable)
		.set({ revision: nextRevision(note.revision), gateId: next?.id ?? null })
		.where(eq(noteTable.id, note.id));
}
