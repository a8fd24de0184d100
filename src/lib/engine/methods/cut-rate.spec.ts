import { describe, expect, it } from 'vitest';
import { cutRate } from './cut-rate';
import { answer } from './method';

const band = (from: number, to: number, flux = 1e-12) => ({ from, to, flux, width: 0.1 });
const at = (bands: object[], time = 1e7) => answer(cutRate, { bands, time });

describe('the cut rate', () => {
	it('sums flux by width by height over the bands', () => {
		const found = at([band(2e5, 4e5, 1e-12), band(4e5, 8e5, 3e-12)]);
		if (!found.ok) throw new Error(found.refusal.message);
		// By hand: 1e-12 · 0.1 · 2e5 + 3e-12 · 0.1 · 4e5 = 1.4e-7 /s.
		expect(found.outputs.rate).toBeCloseTo(1.4e-7, 20);
		expect(found.outputs.probability).toBeCloseTo(1 - Math.exp(-1.4), 12);
		expect(found.outputs.meanTime! * 1.4e-7).toBeCloseTo(1, 12);
		expect(found.warnings).toEqual([]);
	});

	it('keeps the digits of a small probability, which is Λt', () => {
		const found = at([band(2e5, 4e5, 1e-22)], 1);
		if (!found.ok) throw new Error(found.refusal.message);
		expect(found.outputs.probability / 2e-18).toBeCloseTo(1, 12);
	});

	it('has no mean time where nothing cuts', () => {
		const found = at([band(2e5, 4e5, 0)]);
		expect(found).toMatchObject({ ok: true, outputs: { rate: 0, probability: 0 } });
		if (found.ok) expect(found.outputs.meanTime).toBeUndefined();
	});

	it('refuses bands that overlap, do not ascend or have no height', () => {
		const path = (...bands: object[]) => {
			const found = at(bands);
			return found.ok ? undefined : found.refusal.faults[0]?.path;
		};
		expect(path(band(2e5, 4e5), band(3.9e5, 5e5))).toBe('bands.1.from');
		expect(path(band(4e5, 5e5), band(2e5, 3e5))).toBe('bands.1.from');
		expect(path(band(4e5, 4e5))).toBe('bands.0.to');
		expect(path(band(4e5, 3e5))).toBe('bands.0.to');
	});

	it('says which heights no band covers', () => {
		const found = at([band(2e5, 4e5), band(6e5, 8e5)]);
		expect(found).toMatchObject({
			ok: true,
			warnings: [expect.stringContaining('400 km to 600 km')]
		});
	});
});
