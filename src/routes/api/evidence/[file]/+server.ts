import { requireNote } from '$lib/server/auth/guard';
import { findEvidence, removeEvidence } from '$lib/server/evidence/evidence';
import { serveEvidence } from '$lib/server/evidence/serve';

export async function GET(event) {
	const file = await findEvidence(event.params.file);
	await requireNote(event, file.noteId, 'evidence.read');
	return serveEvidence(file, event.request);
}

export async function DELETE(event) {
	const file = await findEvidence(event.params.file);
	await requireNote(event, file.noteId, 'evidence.upload');
	await removeEvidence(file);
	return new Response(null, { status: 204 });
}
