import { describe, expect, it } from 'vitest';
import { dayName, daysSinceJ2000 } from './day';

describe('a day by name', () => {
	// Julian dates of the Explanatory Supplement: J2000 is 2 451 545.0, 1858-11-17 begins the modified ones at 2 400 000.5.
	it('is counted from noon of 1 January 2000', () => {
		expect(daysSinceJ2000('2000-01-01')).toBe(-0.5);
		expect(daysSinceJ2000('1858-11-17')).toBe(2_400_000.5 - 2_451_545);
		expect(dayName(-0.5)).toBe('2000-01-01');
	});

	it('knows leap years', () => {
		expect(daysSinceJ2000('2028-02-29')).toBeDefined();
		expect(daysSinceJ2000('2100-03-01')! - daysSinceJ2000('2100-02-28')!).toBe(1);
	});

	it('is refused where the calendar has none such', () => {
		const none = ['2027-02-29', '2027-13-01', '2027-00-10', '2027-1-1', '0050-01-01x', '', 'today'];
		for (const name of none) expect(daysSinceJ2000(name), name).toBeUndefined();
	});
});
