import * as encoding from 'lib0/encoding';
import { WebSocket } from 'ws';
import { writeUpdate } from 'y-protocols/sync';
import * as Y from 'yjs';
import { addItem } from '$lib/note/document';
import { BLANK } from '$lib/note/items';
import { CLOSE } from '$lib/sync/close-codes';
import { MESSAGE } from '$lib/sync/protocol';
import { expect, test } from './harness';
import { openNote, row, value } from './note-page';

test('an observer reads and cannot change the note by any road', async ({ as, site }) => {
	const laine = await as('laine');
	await openNote(laine, 'CL-DN-005');
	await expect(value(laine, 'cl5-t')).toBeVisible();

	// On the page: no row opens, nothing is added, nothing pinned.
	await row(laine, 'cl5-wind').focus();
	await laine.keyboard.press('Enter');
	await expect(laine.locator('[data-open]')).toHaveCount(0);
	await expect(laine.getByRole('toolbar', { name: 'Add an item' })).toHaveCount(0);
	await expect(laine.getByRole('button', { name: /Remove|Duplicate|Pin a remark/ })).toHaveCount(0);
	await laine.keyboard.press('Delete');
	await expect(row(laine, 'cl5-wind')).toBeVisible();

	// By the API.
	const cookies = await laine.context().cookies();
	const cookie = cookies.map(({ name, value }) => `${name}=${value}`).join('; ');
	const noteId = await laine.evaluate(async () => {
		const entries = performance.getEntriesByType('resource').map(({ name }) => name);
		return entries.join(' ').match(/api\/notes\/([0-9a-f-]{36})/)![1]!;
	});
	for (const [method, path, body] of [
		[
			'POST',
			`/api/notes/${noteId}/remarks`,
			{ itemId: 'cl5-wind', body: 'A remark by an observer' }
		],
		['POST', `/api/notes/${noteId}/baselines`, { revision: 'B' }],
		['POST', `/api/notes/${noteId}/evidence?name=a.txt`, 'text']
	] as const) {
		const answer = await fetch(site.origin + path, {
			method,
			headers: { cookie, origin: site.origin, 'content-type': 'application/json' },
			body: JSON.stringify(body)
		});
		expect(answer.status, path).toBe(403);
		expect(answer.headers.get('content-type')).toContain('application/problem+json');
	}
	for (const page of ['/programmes/CL/notes/CL-DN-005/freeze', '/administration']) {
		expect((await laine.goto(page))?.status(), page).toBe(403);
	}

	// By a socket of their own: the update is refused and reaches nobody.
	const doc = new Y.Doc();
	addItem(doc, { ...BLANK.given, id: 'smuggled', kind: 'given' } as never, { after: null });
	const frame = encoding.createEncoder();
	encoding.writeVarUint(frame, 0);
	writeUpdate(frame, Y.encodeStateAsUpdate(doc));
	const address = `${site.origin.replace('http', 'ws')}/sync/${noteId}`;
	const socket = new WebSocket(address, { headers: { cookie, origin: site.origin } });
	const heard: number[] = [];
	socket.binaryType = 'arraybuffer';
	socket.on('message', (data: ArrayBuffer) => heard.push(new Uint8Array(data)[0]!));
	await new Promise((resolve) => socket.once('open', resolve));
	socket.send(encoding.toUint8Array(frame));
	await expect.poll(() => heard).toContain(MESSAGE.REFUSED);
	socket.close();
	await openNote(laine, 'CL-DN-005');
	await expect(row(laine, 'smuggled')).toHaveCount(0);

	// Without a session the socket closes before anything is told; from another site there is none.
	const unsigned = new WebSocket(address, { headers: { origin: site.origin } });
	const told: unknown[] = [];
	unsigned.on('message', (data) => told.push(data));
	const code = await new Promise((resolve) => unsigned.once('close', resolve));
	expect({ code, told }).toEqual({ code: CLOSE.SIGNED_OUT, told: [] });
	const elsewhere = { cookie, origin: 'https://elsewhere.example' };
	const foreign = new WebSocket(address, { headers: elsewhere });
	const error = await new Promise<Error>((resolve) => foreign.once('error', resolve));
	expect(error.message).toContain('403');
});

test('somebody outside the programme finds nothing there', async ({ as }) => {
	const nwosu = await as('nwosu');
	expect((await nwosu.goto('/programmes/ML'))?.status()).toBe(404);
	expect((await nwosu.goto('/programmes/ML/notes/ML-DN-001'))?.status()).toBe(404);
});
