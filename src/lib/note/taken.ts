/** A given that is taken from the baseline of another note, and whether a newer one says otherwise. */
import type { Outcome } from '../engine/calc/results';
import { formatFigure, unitText } from '../engine/quantities/format';

/** Which quantity of which baseline. */
export type Taken = {
	noteId: string;
	itemId: string;
	/** Output of a line model; empty otherwise. */
	output: string;
	revision: string;
};

/** A quantity that other notes may take: of the latest baseline of its note. */
export type Takeable = Taken & {
	noteNumber: string;
	number: string;
	symbol: string;
	symbolTex: string;
	description: string;
	outcome: Outcome;
};

/** As an item keeps it. */
export const takenText = ({ noteId, itemId, output, revision }: Taken): string =>
	JSON.stringify([noteId, itemId, output, revision]);

/** Null where nothing is taken, or the text is none of ours. */
export function readTaken(text: string): Taken | null {
	if (text === '') return null;
	try {
		const found: unknown = JSON.parse(text);
		if (!Array.isArray(found) || found.length !== 4) return null;
		if (!found.every((part) => typeof part === 'string')) return null;
		const [noteId, itemId, output, revision] = found as [string, string, string, string];
		return { noteId, itemId, output, revision };
	} catch {
		return null;
	}
}

const DIGITS = 8;
/** What is typed has so many digits; below a unit in the last of them nothing has changed. */
const SAME = 10 ** (1 - DIGITS);

/** What stands in the fields of a given once it is taken; null where there is no single value. */
export function fieldsOf(from: Takeable): Record<string, string> | null {
	if (from.outcome.state !== 'value') return null;
	const { value, unit, uncertainty } = from.outcome.quantity;
	const typed = (figure: number) => String(Number(figure.toPrecision(DIGITS)));
	return {
		value: typed(value),
		unit,
		uncertainty: uncertainty === null ? '' : typed(uncertainty),
		source: `${from.noteNumber} baseline ${from.revision}, ${from.number}`
	};
}

/** The same quantity in a newer baseline, where it has another value or uncertainty now; null where not. */
export function newerThan(
	taken: Taken,
	now: Outcome | undefined,
	parameters: readonly Takeable[]
): Takeable | null {
	const latest = parameters.find(
		({ noteId, itemId, output }) =>
			noteId === taken.noteId && itemId === taken.itemId && output === taken.output
	);
	if (!latest || latest.revision === taken.revision) return null;
	return saysTheSame(latest.outcome, now) ? null : latest;
}

function saysTheSame(a: Outcome, b: Outcome | undefined): boolean {
	if (a.state !== 'value' || b?.state !== 'value') return false;
	const near = (x: number, y: number) =>
		Math.abs(x - y) <= SAME * Math.max(Math.abs(x), Math.abs(y));
	const [from, to] = [a.quantity, b.quantity];
	// Another unit of the same size would do, but who took the value took its unit.
	if (!near(from.si, to.si) || from.unit !== to.unit) return false;
	return near(from.uncertainty ?? 0, to.uncertainty ?? 0);
}

/** "108.2 GPa" and the like, for the words beside a given that a newer baseline has moved on from. */
export function takeableWords({ outcome }: Takeable): string {
	if (outcome.state !== 'value') return 'no value';
	const { value, unit, digits } = outcome.quantity;
	return `${formatFigure(value, digits)}\u202f${unitText(unit)}`.trim();
}
