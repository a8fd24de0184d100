import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { UnsavedCount } from './unsaved';

/** The part of a browser's storage that is used. */
class Storage {
	#held = new Map<string, string>();
	get length() {
		return this.#held.size;
	}
	key = (index: number) => [...this.#held.keys()][index] ?? null;
	getItem = (key: string) => this.#held.get(key) ?? null;
	setItem = (key: string, value: string) => void this.#held.set(key, value);
	removeItem = (key: string) => void this.#held.delete(key);
}

beforeEach(() => vi.stubGlobal('localStorage', new Storage()));
afterEach(() => vi.unstubAllGlobals());

const times = (count: number, act: () => void) => Array.from({ length: count }, act);

describe('The count of unsaved edits', () => {
	it('goes up with each edit and down with what is acknowledged', () => {
		const count = new UnsavedCount('note', 1);
		times(3, () => count.add());
		count.acknowledge(2);
		expect(count.unsaved).toBe(1);
		count.acknowledge(3);
		expect(count.unsaved).toBe(0);
		expect(localStorage.length).toBe(0);
	});

	it('is taken over by the next visit, and settled for both by one acknowledgement', () => {
		const [first, second] = [new UnsavedCount('note', 1), new UnsavedCount('note', 2)];
		times(2, () => first.add());
		times(4, () => second.add());
		const next = new UnsavedCount('note', 3);
		expect(next.unsaved).toBe(6);
		next.add();
		next.acknowledge(next.made);
		expect(next.unsaved).toBe(0);
		expect(new UnsavedCount('note', 4).unsaved).toBe(0);
	});

	it('is of one note and one person', () => {
		new UnsavedCount('one', 1).add();
		expect(new UnsavedCount('other', 2).unsaved).toBe(0);
	});

	it('does not fall for a late acknowledgement of less, nor below none', () => {
		const count = new UnsavedCount('note', 1);
		times(3, () => count.add());
		count.acknowledge(3);
		count.acknowledge(1);
		count.acknowledge(9);
		expect(count.unsaved).toBe(0);
	});

	it('works where the browser keeps nothing', () => {
		vi.stubGlobal('localStorage', undefined);
		const count = new UnsavedCount('note', 1);
		count.add();
		expect(count.unsaved).toBe(1);
	});
});
