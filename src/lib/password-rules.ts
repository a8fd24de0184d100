/** What a password must be: told while it is typed, and decided by the server. */
import { COMMON } from './common-passwords';

export type PasswordRule = { holds: boolean; words: string };

export const LEAST = 12;
/** Longer ones would only make hashing slow. */
export const MOST = 256;

export function passwordRules(password: string, person: string[]): PasswordRule[] {
	const length = [...password].length;
	const parts = namesIn(person);
	return [
		length > MOST
			? { holds: false, words: `${length} characters; ${MOST} are the most` }
			: { holds: length >= LEAST, words: `${length} characters; ${LEAST} are needed` },
		{ holds: length > 0 && !isCommon(password), words: 'not among those tried first' },
		{
			holds: length > 0 && !parts.some((part) => password.toLowerCase().includes(part)),
			words: 'without your name or address'
		}
	];
}

export const passwordHolds = (password: string, person: string[]) =>
	passwordRules(password, person).every((rule) => rule.holds);

/** Parts of a name or an address that are long enough to mean the person. */
function namesIn(person: string[]): string[] {
	return person.flatMap((text) => text.toLowerCase().split(/[^\p{L}\p{N}]+/u)).filter(isTelling);
}

const isTelling = (part: string) => part.length >= 4;

/** A common word with figures and marks around it is as common, and so is a run or one repeated piece. */
function isCommon(password: string): boolean {
	const text = password.toLowerCase().replaceAll(' ', '');
	const core = text.replace(/^[^\p{L}]+|[^\p{L}]+$/gu, '');
	return (
		COMMON.has(text) ||
		COMMON.has(core) ||
		/^(.{1,6})\1+$/u.test(text) ||
		[...RUNS].some((run) => run.includes(text))
	);
}

const DIGITS = '01234567890123456789012345678901234567890';
const LETTERS = 'abcdefghijklmnopqrstuvwxyz';
const ROWS = 'qwertyuiopasdfghjklzxcvbnm';
const RUNS = new Set([DIGITS, LETTERS, ROWS].flatMap((run) => [run, [...run].reverse().join('')]));
