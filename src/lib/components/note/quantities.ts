/** The quantities of a sheet: givens, calculations and the outputs of line models. */
import type { ItemResult, Outcome } from '$lib/engine/calc/results';

export type NamedQuantity = {
	item: string;
	/** Output of a line model; empty for a given or a calculation. */
	output: string;
	symbol: string;
	symbolTex: string;
	outcome: Outcome;
};

export function quantitiesOf(result: ItemResult | undefined): NamedQuantity[] {
	if (!result || result.kind === 'check') return [];
	if (result.kind === 'lineModel') {
		return result.outputs.map(({ name, symbolTex, outcome }) => ({
			item: result.id,
			output: name,
			symbol: `${result.symbol}.${name}`,
			symbolTex,
			outcome
		}));
	}
	const { id, symbol, symbolTex, outcome } = result;
	return symbol === '' ? [] : [{ item: id, output: '', symbol, symbolTex, outcome }];
}

export function quantityOf(result: ItemResult | undefined, output: string): NamedQuantity | null {
	return quantitiesOf(result).find((quantity) => quantity.output === output) ?? null;
}
