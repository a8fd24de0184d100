import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { CalculationItem, GivenItem } from '$lib/engine/calc/items';
import type { ItemResult } from '$lib/engine/calc/results';
import { Evaluation, type Port } from './evaluation';
import { merge } from './merge';
import { serve } from './serve';
import type { ToWorker } from './messages';

beforeEach(() => {
	vi.useFakeTimers();
});
afterEach(() => {
	vi.useRealTimers();
});

const given = (id: string, value: string, uncertainty = ''): GivenItem => ({
	id,
	kind: 'given',
	symbol: id,
	value,
	unit: '',
	uncertainty
});
const double: CalculationItem = {
	id: 'double',
	kind: 'calculation',
	symbol: 'double',
	expression: '2 a',
	unit: '',
	digits: ''
};

/** A worker that answers when told to. */
function slowWorker() {
	const inbox: ToWorker[] = [];
	const port: Port = {
		onmessage: null,
		onerror: null,
		postMessage: (message: ToWorker) => inbox.push(message),
		terminate: () => {}
	};
	const receive = serve((data) => port.onmessage?.({ data } as MessageEvent));
	const answer = () => {
		const message = inbox.shift();
		if (message) receive(message);
		return message !== undefined;
	};
	return { port, inbox, answer };
}

function evaluationOn(port: Port) {
	const told: ItemResult[][] = [];
	const failures: string[] = [];
	const evaluation = new Evaluation(
		{
			onResults: (changed) => told.push(changed),
			onFailure: (message) => failures.push(message)
		},
		() => port
	);
	return { evaluation, told, failures };
}

describe('the page’s side of the engine', () => {
	it('sends edits that come while the worker computes as one', () => {
		const { port, inbox, answer } = slowWorker();
		const { evaluation, told } = evaluationOn(port);
		evaluation.apply({ upsert: [given('a', '1')] });
		for (const value of ['2', '3', '4']) evaluation.apply({ upsert: [given('a', value)] });
		expect(inbox).toHaveLength(1);
		while (answer());
		expect(told).toHaveLength(2);
		expect(told[1]).toMatchObject([{ outcome: { quantity: { value: 4 } } }]);
	});

	it('is told uncertainties when no edit has come for a moment', () => {
		const { port, answer } = slowWorker();
		const { evaluation, told } = evaluationOn(port);
		for (const value of ['1', '2']) {
			evaluation.apply({ upsert: [given('a', value, '0.1'), double] });
			answer();
			vi.advanceTimersByTime(20);
		}
		expect(told).toHaveLength(2);
		expect(told[1]).toMatchObject([{ id: 'a' }, { outcome: { quantity: { uncertainty: null } } }]);
		vi.runAllTimers();
		expect(told).toHaveLength(3);
		expect(told[2]).toMatchObject([
			{ id: 'double', outcome: { quantity: { value: 4, uncertainty: 0.2 } } }
		]);
		evaluation.apply({ upsert: [given('b', '7')] });
		answer();
		vi.runAllTimers();
		expect(told).toHaveLength(4);
	});

	it('answers questions in between', async () => {
		const { port, answer } = slowWorker();
		const { evaluation } = evaluationOn(port);
		evaluation.apply({ upsert: [given('mass_1', '1')] });
		const suggestions = evaluation.complete('mass');
		while (answer());
		expect((await suggestions)[0]).toMatchObject({ kind: 'symbol', name: 'mass_1', id: 'mass_1' });
	});

	it('says so when the worker dies, and leaves nobody waiting', async () => {
		const { port } = slowWorker();
		const { evaluation, failures } = evaluationOn(port);
		const suggestions = evaluation.complete('x');
		port.onerror?.({} as ErrorEvent);
		expect(await suggestions).toEqual([]);
		expect(failures[0]).toContain('calculations have stopped');
	});
});

describe('two edits as one', () => {
	it('keep the later of two versions of an item', () => {
		const merged = merge({ upsert: [given('a', '1')] }, { upsert: [given('a', '2')] });
		expect(merged.upsert).toEqual([given('a', '2')]);
	});

	it('drop an item that went again, and still tell that it went', () => {
		expect(merge({ upsert: [given('a', '1')] }, { remove: ['a'] })).toEqual({
			upsert: [],
			remove: ['a']
		});
	});

	it('keep an item that was put back', () => {
		expect(merge({ remove: ['a'] }, { upsert: [given('a', '1')] })).toEqual({
			upsert: [given('a', '1')],
			remove: []
		});
	});

	it('keep order and thin limit where the later says nothing of them', () => {
		expect(merge({ order: ['a'], thinLimit: 0.2 }, {})).toMatchObject({
			order: ['a'],
			thinLimit: 0.2
		});
	});
});
