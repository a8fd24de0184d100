import { csvFile } from '$lib/csv';
import { requireProgramme } from '$lib/server/auth/guard';
import { listNotes } from '$lib/server/notes/list';
import type { RequestHandler } from './$types';

const HEADS = [
	...['number', 'title', 'revision', 'status', 'gate', 'checks hold', 'checks thin'],
	...['checks fail', 'checks wait', 'open remarks', 'last change (UTC)', 'by']
];

export const GET: RequestHandler = async (event) => {
	const { programme } = await requireProgramme(event, event.params.programme, 'note.read');
	const notes = await listNotes([programme.id]);
	const rows = notes.map(({ checks, ...note }) => [
		...[note.number, note.title, note.revision, note.status, note.gate?.kind ?? ''],
		...[checks.holds, checks.thin, checks.fails, checks.waits, note.openRemarks],
		...[note.changedAt, note.changedBy ?? '']
	]);
	return csvFile(`${programme.code} register of notes.csv`, [HEADS, ...rows]);
};
