/**
 * The one description of what is stored. Types of rows are inferred from here; the shape of a note's
 * content is the zod schema in `$lib/note/items`.
 */
import {
	bigint,
	boolean,
	customType,
	date,
	index,
	integer,
	jsonb,
	pgEnum,
	pgTable,
	primaryKey,
	text,
	timestamp,
	unique,
	uniqueIndex,
	uuid,
	varchar
} from 'drizzle-orm/pg-core';
import type { PinnedValue, Waiver, EvidenceDigest } from '$lib/note/frozen';
import type { LineMark, CheckCounts } from '$lib/note/summary';

const bytea = customType<{ data: Uint8Array; driverData: Buffer }>({
	dataType: () => 'bytea',
	toDriver: (value) => Buffer.from(value.buffer, value.byteOffset, value.byteLength),
	fromDriver: (value) => new Uint8Array(value)
});

const moment = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });
const createdAt = () => moment('created_at').notNull().defaultNow();

export const role = pgEnum('role', ['lead', 'engineer', 'reviewer', 'observer']);

// People ------------------------------------------------------------------------------------------

export const user = pgTable('user', {
	id: uuid('id').primaryKey().defaultRandom(),
	/** Lower case; the address is the sign-in name. */
	email: text('email').notNull().unique(),
	/** As it stands on sheets, e.g. "I. Solvang". */
	name: text('name').notNull(),
	passwordHash: text('password_hash').notNull(),
	isAdministrator: boolean('is_administrator').notNull().default(false),
	/** Last use of a session, to a few minutes. */
	lastHereAt: moment('last_here_at'),
	/** End of the visit before the present one: what moved since then is news. */
	lastVisitEndedAt: moment('last_visit_ended_at'),
	createdAt: createdAt()
});

export const session = pgTable(
	'session',
	{
		id: text('id').primaryKey(),
		userId: uuid('user_id')
			.notNull()
			.references(() => user.id, { onDelete: 'cascade' }),
		expiresAt: moment('expires_at').notNull()
	},
	(t) => [index('session_user').on(t.userId)]
);

/** A password reset: single use, expiring; only the token's SHA-256 is kept. */
export const passwordReset = pgTable('password_reset', {
	tokenHash: text('token_hash').primaryKey(),
	userId: uuid('user_id')
		.notNull()
		.references(() => user.id, { onDelete: 'cascade' }),
	expiresAt: moment('expires_at').notNull(),
	usedAt: moment('used_at'),
	createdAt: createdAt()
});

export const tokenScope = pgEnum('token_scope', ['read', 'evaluate']);

/** What lets a program ask the API for a person; only the token's SHA-256 is kept. */
export const apiToken = pgTable(
	'api_token',
	{
		id: uuid('id').primaryKey().defaultRandom(),
		userId: uuid('user_id')
			.notNull()
			.references(() => user.id, { onDelete: 'cascade' }),
		name: text('name').notNull(),
		scope: tokenScope('scope').notNull(),
		tokenHash: text('token_hash').notNull().unique(),
		/** First letters of the token, by which its owner knows it again. */
		begins: text('begins').notNull(),
		expiresAt: moment('expires_at'),
		/** To a minute. */
		lastUsedAt: moment('last_used_at'),
		createdAt: createdAt()
	},
	(t) => [index('api_token_user').on(t.userId)]
);

/** Tries counted against a limit; `key` holds digests of addresses, `expire` is in milliseconds. */
export const rateLimit = pgTable('rate_limit', {
	key: varchar('key', { length: 255 }).primaryKey(),
	points: integer('points').notNull().default(0),
	expire: bigint('expire', { mode: 'number' })
});

// Programmes --------------------------------------------------------------------------------------

export const programme = pgTable('programme', {
	id: uuid('id').primaryKey().defaultRandom(),
	/** Short code that begins every number of the programme, e.g. "CL". */
	code: text('code').notNull().unique(),
	title: text('title').notNull(),
	/** What it is, in a few words: body, anchor, climbers. */
	summary: text('summary').notNull().default(''),
	legalOwner: text('legal_owner').notNull(),
	createdBy: uuid('created_by').references(() => user.id),
	createdAt: createdAt()
});

export const membership = pgTable(
	'membership',
	{
		programmeId: uuid('programme_id')
			.notNull()
			.references(() => programme.id, { onDelete: 'cascade' }),
		userId: uuid('user_id')
			.notNull()
			.references(() => user.id, { onDelete: 'cascade' }),
		role: role('role').notNull(),
		/** Field of work, e.g. "structures". */
		field: text('field').notNull().default(''),
		lastHereAt: moment('last_here_at'),
		createdAt: createdAt()
	},
	(t) => [primaryKey({ columns: [t.programmeId, t.userId] }), index('membership_user').on(t.userId)]
);

/** An invitation into a programme: single use, expiring; only the token's SHA-256 is kept. */
export const invitation = pgTable(
	'invitation',
	{
		id: uuid('id').primaryKey().defaultRandom(),
		tokenHash: text('token_hash').notNull().unique(),
		programmeId: uuid('programme_id')
			.notNull()
			.references(() => programme.id, { onDelete: 'cascade' }),
		email: text('email').notNull(),
		role: role('role').notNull(),
		field: text('field').notNull().default(''),
		message: text('message').notNull().default(''),
		invitedBy: uuid('invited_by')
			.notNull()
			.references(() => user.id),
		createdAt: createdAt(),
		expiresAt: moment('expires_at').notNull(),
		acceptedAt: moment('accepted_at'),
		declinedAt: moment('declined_at'),
		withdrawnAt: moment('withdrawn_at')
	},
	(t) => [index('invitation_programme').on(t.programmeId)]
);

export const gate = pgTable(
	'gate',
	{
		id: uuid('id').primaryKey().defaultRandom(),
		programmeId: uuid('programme_id')
			.notNull()
			.references(() => programme.id, { onDelete: 'cascade' }),
		/** SRR, PDR, CDR, QR, AR or the programme's own. */
		kind: text('kind').notNull(),
		name: text('name').notNull(),
		date: date('date', { mode: 'string' }),
		/** 0 is the first gate of the programme. */
		position: integer('position').notNull(),
		createdAt: createdAt()
	},
	(t) => [index('gate_programme').on(t.programmeId)]
);

// Notes -------------------------------------------------------------------------------------------

export const note = pgTable(
	'note',
	{
		id: uuid('id').primaryKey().defaultRandom(),
		programmeId: uuid('programme_id')
			.notNull()
			.references(() => programme.id, { onDelete: 'cascade' }),
		/** Identification number, unique in the programme, e.g. "CL-DN-004". */
		number: text('number').notNull(),
		title: text('title').notNull(),
		department: text('department').notNull().default(''),
		technicalReference: text('technical_reference').notNull().default(''),
		/** Letter of the revision being written. */
		revision: text('revision').notNull().default('A'),
		/** Gate that this revision is written for. */
		gateId: uuid('gate_id').references(() => gate.id, { onDelete: 'set null' }),
		creatorId: uuid('creator_id')
			.notNull()
			.references(() => user.id),
		approverId: uuid('approver_id').references(() => user.id),
		/** Sequence number of the newest committed update of the document. */
		seq: bigint('seq', { mode: 'number' }).notNull().default(0),
		changedAt: moment('changed_at').notNull().defaultNow(),
		changedBy: uuid('changed_by').references(() => user.id),
		createdAt: createdAt()
	},
	(t) => [unique('note_number').on(t.programmeId, t.number)]
);

/** The tail of a note's document: Yjs updates in the order in which they were committed. */
export const noteUpdate = pgTable(
	'note_update',
	{
		noteId: uuid('note_id')
			.notNull()
			.references(() => note.id, { onDelete: 'cascade' }),
		seq: bigint('seq', { mode: 'number' }).notNull(),
		update: bytea('update').notNull(),
		userId: uuid('user_id').references(() => user.id),
		createdAt: createdAt()
	},
	(t) => [primaryKey({ columns: [t.noteId, t.seq] })]
);

/** The document folded up to and including update `seq`. */
export const noteSnapshot = pgTable('note_snapshot', {
	noteId: uuid('note_id')
		.primaryKey()
		.references(() => note.id, { onDelete: 'cascade' }),
	seq: bigint('seq', { mode: 'number' }).notNull(),
	state: bytea('state').notNull(),
	createdAt: createdAt()
});

/** What registers and the home page show of a note without opening its document. */
export const noteSummary = pgTable('note_summary', {
	noteId: uuid('note_id')
		.primaryKey()
		.references(() => note.id, { onDelete: 'cascade' }),
	seq: bigint('seq', { mode: 'number' }).notNull(),
	checks: jsonb('checks').$type<CheckCounts>().notNull(),
	marks: jsonb('marks').$type<LineMark[]>().notNull(),
	itemCount: integer('item_count').notNull(),
	evaluatedAt: moment('evaluated_at').notNull().defaultNow()
});

/** Who wrote an item, as the server saw it; outlives the item so that pins keep their place. */
export const noteItem = pgTable(
	'note_item',
	{
		noteId: uuid('note_id')
			.notNull()
			.references(() => note.id, { onDelete: 'cascade' }),
		itemId: text('item_id').notNull(),
		kind: text('kind').notNull(),
		/** Number, symbol and description when last seen. */
		number: text('number').notNull(),
		symbol: text('symbol').notNull().default(''),
		description: text('description').notNull().default(''),
		createdBy: uuid('created_by').references(() => user.id),
		createdAt: createdAt(),
		changedBy: uuid('changed_by').references(() => user.id),
		changedAt: moment('changed_at').notNull().defaultNow(),
		removedBy: uuid('removed_by').references(() => user.id),
		removedAt: moment('removed_at')
	},
	(t) => [primaryKey({ columns: [t.noteId, t.itemId] })]
);

/** What last moved a check from one state to another. */
export const checkMovement = pgTable(
	'check_movement',
	{
		noteId: uuid('note_id')
			.notNull()
			.references(() => note.id, { onDelete: 'cascade' }),
		itemId: text('item_id').notNull(),
		stateBefore: text('state_before').notNull(),
		state: text('state').notNull(),
		/** The edited item upstream that moved it; null when the check itself was edited. */
		causeItemId: text('cause_item_id'),
		causeBefore: text('cause_before').notNull().default(''),
		causeAfter: text('cause_after').notNull().default(''),
		movedBy: uuid('moved_by').references(() => user.id),
		movedAt: moment('moved_at').notNull()
	},
	(t) => [primaryKey({ columns: [t.noteId, t.itemId] })]
);

export const evidenceFile = pgTable(
	'evidence_file',
	{
		id: uuid('id').primaryKey().defaultRandom(),
		noteId: uuid('note_id')
			.notNull()
			.references(() => note.id, { onDelete: 'restrict' }),
		name: text('name').notNull(),
		mediaType: text('media_type').notNull(),
		size: bigint('size', { mode: 'number' }).notNull(),
		sha256: text('sha256').notNull(),
		objectKey: text('object_key').notNull(),
		uploadedBy: uuid('uploaded_by')
			.notNull()
			.references(() => user.id),
		createdAt: createdAt()
	},
	(t) => [index('evidence_file_note').on(t.noteId)]
);

// Remarks -----------------------------------------------------------------------------------------

export const remark = pgTable(
	'remark',
	{
		id: uuid('id').primaryKey().defaultRandom(),
		noteId: uuid('note_id')
			.notNull()
			.references(() => note.id, { onDelete: 'cascade' }),
		itemId: text('item_id').notNull(),
		/** The item as the server computed it when pinned, at this update of the document. */
		seq: bigint('seq', { mode: 'number' }).notNull(),
		pinned: jsonb('pinned').$type<PinnedValue>().notNull(),
		authorId: uuid('author_id')
			.notNull()
			.references(() => user.id),
		body: text('body').notNull(),
		createdAt: createdAt(),
		settledBy: uuid('settled_by').references(() => user.id),
		settledAt: moment('settled_at')
	},
	(t) => [index('remark_note').on(t.noteId)]
);

export const remarkReply = pgTable(
	'remark_reply',
	{
		id: uuid('id').primaryKey().defaultRandom(),
		remarkId: uuid('remark_id')
			.notNull()
			.references(() => remark.id, { onDelete: 'cascade' }),
		authorId: uuid('author_id')
			.notNull()
			.references(() => user.id),
		body: text('body').notNull(),
		createdAt: createdAt()
	},
	(t) => [index('remark_reply_remark').on(t.remarkId)]
);

// Baselines ---------------------------------------------------------------------------------------

/** A note frozen at a gate. A trigger refuses UPDATE, DELETE and TRUNCATE. */
export const baseline = pgTable(
	'baseline',
	{
		id: uuid('id').primaryKey().defaultRandom(),
		noteId: uuid('note_id')
			.notNull()
			.references(() => note.id, { onDelete: 'restrict' }),
		revision: text('revision').notNull(),
		gateId: uuid('gate_id')
			.notNull()
			.references(() => gate.id, { onDelete: 'restrict' }),
		/** The update of the document that was frozen. */
		seq: bigint('seq', { mode: 'number' }).notNull(),
		state: bytea('state').notNull(),
		/** Canonical JSON texts; the digest is taken over them byte for byte. */
		head: text('head').notNull(),
		content: text('content').notNull(),
		results: text('results').notNull(),
		evidence: jsonb('evidence').$type<EvidenceDigest[]>().notNull(),
		waivers: jsonb('waivers').$type<Waiver[]>().notNull(),
		/** SHA-256, lower-case hexadecimal. */
		digest: text('digest').notNull(),
		engineVersion: text('engine_version').notNull(),
		frozenBy: uuid('frozen_by')
			.notNull()
			.references(() => user.id),
		frozenAt: moment('frozen_at').notNull().defaultNow()
	},
	(t) => [uniqueIndex('baseline_revision').on(t.noteId, t.revision)]
);

/** Evidence that a baseline stands on cannot be removed. */
export const baselineEvidence = pgTable(
	'baseline_evidence',
	{
		baselineId: uuid('baseline_id')
			.notNull()
			.references(() => baseline.id, { onDelete: 'restrict' }),
		fileId: uuid('file_id')
			.notNull()
			.references(() => evidenceFile.id, { onDelete: 'restrict' })
	},
	(t) => [primaryKey({ columns: [t.baselineId, t.fileId] })]
);

/** Who has looked at which baseline; the rest waits for them on the home page. */
export const baselineView = pgTable(
	'baseline_view',
	{
		baselineId: uuid('baseline_id')
			.notNull()
			.references(() => baseline.id, { onDelete: 'cascade' }),
		userId: uuid('user_id')
			.notNull()
			.references(() => user.id, { onDelete: 'cascade' }),
		viewedAt: moment('viewed_at').notNull().defaultNow()
	},
	(t) => [primaryKey({ columns: [t.baselineId, t.userId] })]
);
