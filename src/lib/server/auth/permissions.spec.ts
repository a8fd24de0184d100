import { describe, expect, test } from 'vitest';
import { may, mayOnSite, PROGRAMME_ACTIONS, ROLES, SITE_ACTIONS } from './permissions';

/** The whole table, typed again from the description of the roles: lead, engineer, reviewer, observer. */
const EXPECTED: Record<string, string> = {
	'programme.read': 'l e r o',
	'programme.change': 'l - - -',
	'people.read': 'l e r o',
	'people.invite': 'l - - -',
	'people.change': 'l - - -',
	'gate.change': 'l - - -',
	'note.read': 'l e r o',
	'note.create': 'l e - -',
	'note.edit': 'l e - -',
	'presence.share': 'l e r o',
	'remark.read': 'l e r o',
	'remark.write': 'l e r -',
	'remark.settle': 'l e r -',
	'evidence.read': 'l e r o',
	'evidence.upload': 'l e - -',
	'baseline.read': 'l e r o',
	'baseline.verify': 'l e r o',
	'baseline.freeze': 'l - - -'
};

describe('the table of permissions', () => {
	test('has every action that is described, and no other', () => {
		expect([...PROGRAMME_ACTIONS].sort()).toEqual(Object.keys(EXPECTED).sort());
	});

	test.each(PROGRAMME_ACTIONS)('%s is open to the roles described', (action) => {
		const row = ROLES.map((role) => (may(role, action) ? role[0] : '-')).join(' ');
		expect(row).toBe(EXPECTED[action]);
	});

	test.each(PROGRAMME_ACTIONS)('%s is closed to somebody who is not in the programme', (action) => {
		expect(may(null, action)).toBe(false);
	});

	test.each(SITE_ACTIONS)('%s is for the administrator of the site alone', (action) => {
		expect(mayOnSite({ isAdministrator: true }, action)).toBe(true);
		expect(mayOnSite({ isAdministrator: false }, action)).toBe(false);
	});
});
