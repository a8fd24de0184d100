/** The status of a note, as its title block and the register put it. */
export function noteStatus(
	seq: number,
	baseline: { revision: string; seq: number } | null
): string {
	if (!baseline) return 'Draft';
	return seq === baseline.seq
		? `As frozen in baseline ${baseline.revision}`
		: `Draft, after baseline ${baseline.revision}`;
}
