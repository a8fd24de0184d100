import { expect, test } from 'vitest';
import { passwordHolds, passwordRules } from './password-rules';

const person = ['C. Ferrand', 'ferrand@kelda.example'];
const words = (password: string) =>
	passwordRules(password, person)
		.filter((rule) => !rule.holds)
		.map((rule) => rule.words);

test('a long phrase holds', () => {
	expect(passwordHolds('a tape of many strands', person)).toBe(true);
});

test('eleven characters are too few and twelve are enough', () => {
	expect(words('kx7 vem qoz')).toEqual(['11 characters; 12 are needed']);
	expect(words('kx7 vem qozl')).toEqual([]);
});

test('a character outside the basic plane counts once', () => {
	expect(words('🜁🜂🜃🜄🜁🜂🜃🜄🜁🜂🜃')).toEqual(['11 characters; 12 are needed']);
});

test.each([
	'password1234',
	'Password!!!!!',
	'123456789012',
	'987654321098',
	'qwertyuiopas',
	'abcabcabcabc',
	'aaaaaaaaaaaaaa',
	'WelcomeBack2026',
	'correct horse battery staple'
])('%s is tried first', (password) => {
	expect(words(password)).toEqual(['not among those tried first']);
});

test.each(['my ferrand password', 'kelda kelda blue', 'FERRAND-upstairs'])(
	'%s holds the name or the address',
	(password) => {
		expect(words(password)).toEqual(['without your name or address']);
	}
);

test('initials are too short to be a name', () => {
	expect(words('c strands of tape')).toEqual([]);
});

test('an empty password meets no rule', () => {
	expect(words('')).toHaveLength(3);
});

test('a password without end is refused', () => {
	expect(words('ab cd'.repeat(60))).toContain('300 characters; 256 are the most');
});
