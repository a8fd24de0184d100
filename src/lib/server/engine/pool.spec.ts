import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { bundleEngineWorker } from '../../../../server/engine/bundle';
import type { SheetChange } from '$lib/engine/calc/items';
import type { EngineTask } from '$lib/engine-task';
import { createSheet } from '$lib/engine/calc/sheet';
import { answer } from '$lib/engine/methods/method';
import { uniformLine } from '$lib/engine/methods/uniform-line';
import { EnginePool } from './pool';

const folder = mkdtempSync(join(tmpdir(), 'holdfast-engine-'));
afterAll(() => rmSync(folder, { recursive: true }));

const limits = { subject: 'The note', milliseconds: 2000, megabytes: 256, threads: 1 };

describe('the engine on the server', () => {
	const worker = join(folder, 'worker.mjs');
	let pool: EnginePool<EngineTask, unknown>;
	beforeAll(async () => {
		await bundleEngineWorker(worker);
		pool = new EnginePool({ ...limits, worker });
	});
	afterAll(() => pool.close());

	it('gives the same results as the engine in this process', async () => {
		const note: SheetChange = {
			upsert: [
				{ id: 'a', kind: 'given', symbol: 'σ_al', value: '110', unit: 'GPa', uncertainty: '' },
				{ id: 'b', kind: 'calculation', symbol: '', expression: 'σ_al/2', unit: '', digits: '' }
			],
			order: ['a', 'b']
		};
		const here = createSheet();
		here.apply(note);
		expect(await pool.run({ kind: 'note', change: note })).toEqual(here.results());
	});

	it('answers a method by its name, a refusal as well', async () => {
		const site = { kind: 'body', body: 'earth' };
		const input = { site, density: 1300, stress: 5e9 };
		const run = (input: unknown) => pool.run({ kind: 'method', name: 'uniform-line', input });
		expect(await run(input)).toEqual(answer(uniformLine, input));
		expect(await run({ site })).toMatchObject({ ok: false, refusal: { code: 'input' } });
	});
});

describe('a thread that misbehaves', () => {
	const worker = join(folder, 'misbehaving.mjs');
	const pool = () =>
		new EnginePool<'loop' | 'fill' | 'answer', string>({
			...limits,
			worker,
			milliseconds: 300,
			megabytes: 32
		});
	beforeAll(() => {
		writeFileSync(
			worker,
			`export default ({ input, begun }) => {
				begun.postMessage(null);
				if (input === 'loop') for (;;);
				if (input === 'fill') for (const kept = []; ; ) kept.push(new Array(1e5).fill({}));
				return 'answered';
			};`
		);
	});

	it('is ended when its time is up, and the next task is answered', async () => {
		const threads = pool();
		await expect(threads.run('loop')).rejects.toThrow('could not be computed within 0.3 s');
		expect(await threads.run('answer')).toBe('answered');
		await threads.close();
	});

	it('is ended when its memory is used up, and the next task is answered', async () => {
		const threads = pool();
		await expect(threads.run('fill')).rejects.toThrow(/could not be computed within/);
		expect(await threads.run('answer')).toBe('answered');
		await threads.close();
	});

	it('does not count the time that a task waits for a thread', async () => {
		const threads = pool();
		const first = threads.run('loop');
		const second = threads.run('answer');
		await expect(first).rejects.toThrow();
		expect(await second).toBe('answered');
		await threads.close();
	});
});
