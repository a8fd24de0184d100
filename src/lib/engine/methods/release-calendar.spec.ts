import { describe, expect, it } from 'vitest';
import { answer } from './method';
import { releaseCalendar } from './release-calendar';

const earth = { kind: 'body', body: 'earth' };
const at = (input: object) => answer(releaseCalendar, { site: earth, radius: 1e8, ...input });
const days = (from: string, count: number, step?: number) => ({ kind: 'days', from, count, step });

describe('the release calendar', () => {
	it('takes days from a first one on, and days by name, alike', () => {
		const counted = at({ when: days('2028-02-28', 3) });
		const named = at({
			when: { kind: 'dates', dates: ['2028-02-28', '2028-02-29', '2028-03-01'] }
		});
		if (!counted.ok || !named.ok) throw new Error('refused');
		expect(counted.outputs).toEqual(named.outputs);
		expect(counted.outputs.days.map(({ date }) => date)).toEqual([
			'2028-02-28',
			'2028-02-29',
			'2028-03-01'
		]);
	});

	it('states the tilt and the distance that it used', () => {
		// Mean obliquity at J2000, IAU 2006: 84 381.406″.
		const found = at({ when: days('2027-01-01', 1) });
		if (!found.ok) throw new Error(found.refusal.message);
		expect((found.outputs.tilt * 180 * 3600) / Math.PI).toBeCloseTo(84_381.406, 6);
		expect(found.outputs.sunDistance).toBe(149_597_870_700);
	});

	it('refuses what is no day, and days beyond those of the ephemeris', () => {
		const path = (when: object) => {
			const found = at({ when });
			return found.ok ? undefined : found.refusal.faults[0]?.path;
		};
		expect(path({ kind: 'dates', dates: ['2027-03-20', '2027-02-30'] })).toBe('when.dates.1');
		expect(path(days('1899-12-31', 1))).toBe('when.from');
		expect(path(days('2100-12-31', 1))).toBeUndefined();
		expect(path(days('2100-12-31', 2))).toBe('when.count');
	});

	it('refuses a radius from which nothing escapes, and says from where it does', () => {
		expect(at({ radius: 5e7, when: days('2027-01-01', 1) })).toMatchObject({
			refusal: { remedy: expect.stringContaining('53') }
		});
	});

	it('takes other bodies by the Sun’s longitudes and their tilt, not by days', () => {
		const mars = { kind: 'body', body: 'mars' };
		const longitudes = { kind: 'longitudes', longitudes: [0, 1] };
		const tilt = 0.44;
		expect(at({ site: mars, when: longitudes, tilt }).ok).toBe(true);
		expect(at({ site: mars, when: longitudes })).toMatchObject({
			refusal: { faults: [{ path: 'tilt' }] }
		});
		expect(at({ site: mars, when: days('2027-01-01', 1), tilt })).toMatchObject({
			refusal: { faults: [{ path: 'when' }] }
		});
	});

	it('refuses a motion that stands upright on the equator', () => {
		const upright = { when: { kind: 'longitudes', longitudes: [0] }, tilt: Math.PI / 2 };
		expect(at(upright)).toMatchObject({
			refusal: { message: expect.stringContaining('upright') }
		});
	});
});
