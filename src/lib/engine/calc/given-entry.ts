/** A given in the sheet. */
import { parseUnit } from '../quantities/units';
import type { Entry, ResultLinks } from './entry';
import { evaluateGiven } from './given';
import { valueType } from './value-type';
import type { GivenItem } from './items';
import type { Fault, Outcome, QuantityResult } from './results';
import type { Scope } from './scope';
import type { Slot } from './slot';
import { readSymbol } from './symbol';
import { symbolTex } from './tex';

export class GivenEntry implements Entry {
	readonly symbol: string;
	readonly defines: readonly string[];
	readonly mentions: readonly string[] = [];
	readonly width = 1;
	private trouble: Fault | null;
	private outcome: Outcome = { state: 'blank' };

	constructor(readonly item: GivenItem) {
		({ symbol: this.symbol, trouble: this.trouble } = readSymbol(item.symbol));
		this.defines = this.symbol === '' ? [] : [this.symbol];
	}

	evaluate(slots: readonly Slot[], _scope: Scope, _thinLimit: number, objection: Fault | null) {
		const { item } = this;
		const slot = slots[0]!;
		const against = this.trouble ?? objection;
		this.outcome = against ? { state: 'fault', faults: [against] } : evaluateGiven(item);
		const parsed = parseUnit(item.unit);
		if (this.outcome.state !== 'value' || !parsed.ok) return slot.lack([item.id]);
		const { si, dimension, unit, digits, uncertainty } = this.outcome.quantity;
		const type = valueType(dimension, parsed.unit.offset !== 0 ? 'point' : 'plain');
		slot.give(si, { type, unit, digits });
		slot.uncertainty = uncertainty && uncertainty * parsed.unit.factor;
	}

	/** It names nothing, so nothing moves it but an edit. */
	refresh = () => null;

	linear = () => [];

	result(_slots: readonly Slot[], { uses, usedIn }: ResultLinks): QuantityResult {
		const { item, symbol, outcome } = this;
		return {
			id: item.id,
			kind: 'given',
			symbol: item.symbol.trim(),
			tex: '',
			symbolTex: symbol === '' ? '' : symbolTex(symbol),
			outcome,
			uses,
			usedIn
		};
	}
}
