/** What the page of a note is given by the server. */
import type { NotePage } from '$lib/server/notes/page';

export type NoteHead = NotePage;

export type ProgrammeHead = { code: string; title: string; summary: string; legalOwner: string };

/** What the title block can name. */
export type Choices = {
	people: { id: string; name: string }[];
	gates: { id: string; kind: string; name: string }[];
};
