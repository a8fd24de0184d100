/**
 * Revision letters as drawings use them: A, B, C … without I, O, Q, S, X and Z, which are misread;
 * after Y come AA, AB … AY, BA (ASME Y14.35; common practice).
 */
const LETTERS = 'ABCDEFGHJKLMNPRTUVWY';

export function nextRevision(revision: string): string {
	const last = revision.slice(-1);
	const before = revision.slice(0, -1);
	const index = LETTERS.indexOf(last);
	if (index < 0 || last === '') throw new RangeError(`"${revision}" is no revision letter.`);
	if (index < LETTERS.length - 1) return before + LETTERS[index + 1];
	return (before === '' ? 'A' : nextRevision(before)) + 'A';
}
