/** What the page of a note is given by the server. */
import type { Role } from '$lib/server/auth/permissions';

export type NoteHead = {
	id: string;
	number: string;
	title: string;
	department: string;
	technicalReference: string;
	revision: string;
	creator: string;
	approver: { id: string; name: string } | null;
	gate: { id: string; kind: string; name: string; date: string | null } | null;
	seq: number;
	baseline: { id: string; revision: string; frozenAt: Date; digest: string } | null;
};

export type ProgrammeHead = { code: string; title: string; summary: string; legalOwner: string };

export type Choices = {
	people: { id: string; name: string }[];
	gates: { id: string; kind: string; name: string; date: string | null }[];
};

export type Me = { id: string; name: string; role: Role };
