/**
 * A network that drops connections at random while several people edit one note through two processes:
 * once it is quiet, everybody and the database hold the same note. The seed is printed on a failure.
 */
import fc from 'fast-check';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { loadDocument } from '$lib/server/notes/document';
import { addItem, itemsMap, moveItem, removeItem, textField } from '$lib/note/document';
import { orderedIds } from '$lib/note/order';
import { projectNote } from '$lib/note/projection';
import { makeNote, makeProgramme } from './fixtures';
import { eventually, join, startServer, type Joined, type TestServer } from './sync-client';

let servers: [TestServer, TestServer];
beforeAll(async () => {
	servers = [await startServer(), await startServer()];
});
afterAll(() => Promise.all(servers.map((server) => server.stop())));

const who = fc.nat(3);
const place = fc.nat(20);
const step = fc.oneof(
	{ weight: 3, arbitrary: fc.record({ kind: fc.constant('add' as const), who, place }) },
	{ weight: 6, arbitrary: fc.record({ kind: fc.constant('type' as const), who, place }) },
	{ weight: 2, arbitrary: fc.record({ kind: fc.constant('move' as const), who, place }) },
	{ weight: 1, arbitrary: fc.record({ kind: fc.constant('remove' as const), who, place }) },
	{ weight: 2, arbitrary: fc.record({ kind: fc.constant('drop' as const), who, place }) },
	{ weight: 3, arbitrary: fc.record({ kind: fc.constant('return' as const), who, place }) },
	{ weight: 2, arbitrary: fc.record({ kind: fc.constant('wait' as const), who, place }) }
);

async function take(client: Joined, { kind, place }: { kind: string; place: number }) {
	const { doc, provider } = client;
	const ids = orderedIds(doc);
	const id = ids[place % Math.max(1, ids.length)];
	if (kind === 'drop') provider.disconnect();
	else if (kind === 'return') provider.connect();
	else if (kind === 'wait') await new Promise((resolve) => setImmediate(resolve));
	else if (kind === 'add') addItem(doc, { kind: 'check' }, { after: id ?? null });
	else if (id === undefined) return;
	else if (kind === 'move') moveItem(doc, id, { after: ids[0]! });
	else if (kind === 'remove') removeItem(doc, id);
	else textField(doc, id, 'left')!.insert(0, `${place}`);
}

test('everybody holds the same note once the network is quiet', { timeout: 60_000 }, async () => {
	await fc.assert(
		fc.asyncProperty(fc.array(step, { minLength: 20, maxLength: 80 }), async (steps) => {
			const { programme, lead, engineer } = await makeProgramme();
			const { id } = await makeNote(programme.id, lead);
			const clients = await Promise.all(
				[lead, engineer, lead, engineer].map((person, index) =>
					join(servers[index % 2]!, id, person)
				)
			);
			for (const one of steps) await take(clients[one.who]!, one);
			for (const { provider } of clients) provider.connect();
			await eventually(() => {
				for (const { provider, mark } of clients) {
					expect(provider.synced).toBe(true);
					mark(1);
				}
			});
			await eventually(async () => {
				for (const client of clients) {
					expect(client.saved.length).toBeGreaterThan(0);
					expect(itemsMap(client.doc).toJSON()).toEqual(itemsMap(clients[0]!.doc).toJSON());
				}
				expect(projectNote((await loadDocument(id)).doc)).toEqual(projectNote(clients[0]!.doc));
			});
			for (const client of clients) client.leave();
		}),
		{ numRuns: 12 }
	);
});
