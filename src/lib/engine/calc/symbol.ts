/** The symbol of an item as others name it, or what is wrong with it. */
import { fault } from './faults';
import { canonical, symbolTrouble } from './names';
import type { Fault } from './results';

export type ReadSymbol = {
	/** Empty where there is none that can be named. */
	symbol: string;
	trouble: Fault | null;
};

export function readSymbol(typed: string): ReadSymbol {
	const symbol = canonical(typed.trim());
	const trouble = symbol === '' ? null : symbolTrouble(symbol);
	if (!trouble) return { symbol, trouble: null };
	const span = { field: 'symbol', from: 0, to: typed.length };
	const reason = fault('bad-symbol', trouble.message, { remedy: trouble.remedy, span });
	return { symbol: '', trouble: reason };
}
