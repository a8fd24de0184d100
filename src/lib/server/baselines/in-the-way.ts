/** What stands in the way of freezing a note. */
import type { Fault, ItemResult, Outcome } from '$lib/engine/calc/results';
import { amount, marginWords } from '$lib/components/note/figures';
import { capital } from '$lib/counts';
import type { Item, NoteContent } from '$lib/note/items';
import { numberItems } from '$lib/note/numbering';
import { descriptionOf } from '$lib/note/pinned';

export type InTheWay = {
	/** Only a failing check can be let through by a waiver. */
	kind: 'cannot be computed' | 'fails' | 'file missing';
	itemId: string;
	number: string;
	symbol: string;
	description: string;
	/** A sentence, or the margin of a failing check. */
	reason: string;
};

export function inTheWay(content: NoteContent, results: readonly ItemResult[]): InTheWay[] {
	const byId = new Map(results.map((result) => [result.id, result]));
	const numbers = numberItems(content.items);
	return content.items.flatMap((item): InTheWay[] => {
		const found = obstacle(byId.get(item.id));
		return found ? [{ ...found, ...named(item, numbers) }] : [];
	});
}

export function named(item: Item, numbers: Map<string, string>) {
	return {
		itemId: item.id,
		number: numbers.get(item.id) ?? '',
		symbol: 'symbol' in item ? item.symbol : '',
		description: descriptionOf(item)
	};
}

function obstacle(result: ItemResult | undefined): Pick<InTheWay, 'kind' | 'reason'> | null {
	switch (result?.kind) {
		case 'given':
		case 'calculation': {
			const reason = withoutValue(result.outcome);
			return reason === '' ? null : { kind: 'cannot be computed', reason };
		}
		case 'check': {
			if (result.state === 'fails') {
				const short = result.shortBy && `short by ${amount(result.shortBy)}`;
				const margin = result.margin && `margin ${marginWords(result.margin)}`;
				const words = [short, margin].filter(Boolean).join(', ');
				return { kind: 'fails', reason: `${capital(words)}.` };
			}
			if (result.state !== 'waits') return null;
			const sides = [result.left, result.right, result.tolerance].map(withoutValue);
			const reason = sentences(result.faults) || sides.find(Boolean) || 'A side has no value.';
			return { kind: 'cannot be computed', reason };
		}
		case 'lineModel': {
			const faults = sentences(result.faults.map(({ fault }) => fault));
			const waits = result.waitsFor.length > 0 ? waiting(result.waitsFor) : '';
			const output = result.outputs.map(({ outcome }) => withoutValue(outcome)).find(Boolean);
			const reason = faults || waits || output || '';
			return reason === '' ? null : { kind: 'cannot be computed', reason };
		}
		default:
			return null;
	}
}

/** Why there is no value; empty where there is one. */
function withoutValue(outcome: Outcome | null): string {
	switch (outcome?.state) {
		case 'blank':
			return 'Nothing is given here yet.';
		case 'waits':
			return waiting(outcome.for);
		case 'fault':
			return sentences(outcome.faults);
		default:
			return '';
	}
}

const waiting = (symbols: readonly string[]) => `Waits for ${symbols.join(', ')}.`;

const sentences = (faults: readonly Fault[]) =>
	faults.map(({ message, remedy }) => `${message} ${remedy}`.trim()).join(' ');
