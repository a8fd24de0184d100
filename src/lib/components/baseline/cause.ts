import { FIELD_WORDS } from '$lib/note/compare';
import type { Cause } from '$lib/note/comparison';

/** Causes that are named; the rest is told by an ellipsis. */
const SHOWN = 3;

/** Why a figure moved, in a few words. */
export function causeWords(cause: Cause): string {
	switch (cause.kind) {
		case 'typed': {
			if (cause.fields.includes('value')) return 'given';
			return `by its ${cause.fields.map((field) => FIELD_WORDS[field] ?? field).join(', ')}`;
		}
		case 'upstream':
			return `by ${cause.numbers.slice(0, SHOWN).join(', ')}${cause.numbers.length > SHOWN ? ' …' : ''}`;
		case 'thin limit':
			return 'by the thin limit';
		case 'engine':
			return 'by another version of the engine';
	}
}
