import { DrizzleQueryError } from 'drizzle-orm/errors';
import { expect, test } from 'vitest';
import { loggedError } from './log';

test('a failed query is logged with its cause and without its values', () => {
	const cause = new Error('connection refused');
	const error = new DrizzleQueryError(
		'select from session where id = $1',
		['first line\ns3cr3t'],
		cause
	);
	const logged = JSON.stringify(loggedError(error));
	expect(logged).toContain('select from session where id = $1');
	expect(logged).toContain('connection refused');
	expect(logged).not.toContain('s3cr3t');
});

test('what is no error is logged as it is', () => {
	expect(loggedError('gone')).toBe('gone');
});
