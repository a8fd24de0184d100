/** So many of so many agree; what does not is named. */
export type Tally = { agree: number; of: number; differ: string[] };

export const tally = (of: number, differ: string[]): Tally => ({
	agree: of - differ.length,
	of,
	differ
});

/** The sealed text cannot even be read back. */
export const UNREADABLE: Tally = tally(1, ['cannot be read']);
