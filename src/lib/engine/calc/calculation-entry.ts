/** A calculation in the sheet. */
import { fromSi } from '../quantities/units';
import { LARGEST } from './compile';
import type { Entry, Refreshed, ResultLinks } from './entry';
import { Refusal } from './faults';
import { Formula } from './formula';
import type { CalculationItem } from './items';
import { largestOf, listed } from './listed';
import { inUnit, parseDigits, showing, uncertaintyIn, type Showing } from './quantity';
import type { Fault, Outcome, QuantityResult } from './results';
import type { Scope } from './scope';
import type { Slot } from './slot';
import { readSymbol } from './symbol';
import { symbolTex } from './tex';

export class CalculationEntry implements Entry {
	readonly symbol: string;
	readonly symbolTex: string;
	private typedSymbol: string;
	readonly defines: readonly string[];
	readonly mentions: readonly string[];
	readonly width = 1;
	private trouble: Fault | null;
	private formula: Formula;
	private digits: number | Fault;
	/** How the value is shown, or why there is none. */
	private how: Showing | null = null;
	private without: Outcome = { state: 'blank' };

	constructor(readonly item: CalculationItem) {
		({ symbol: this.symbol, trouble: this.trouble } = readSymbol(item.symbol));
		this.typedSymbol = item.symbol.trim();
		this.symbolTex = this.symbol === '' ? '' : symbolTex(this.symbol);
		this.formula = new Formula(item.expression, 'expression', true);
		this.digits = parseDigits(item.digits);
		this.defines = this.symbol === '' ? [] : [this.symbol];
		this.mentions = [...new Set(this.formula.mentions)];
	}

	evaluate(slots: readonly Slot[], scope: Scope, _thinLimit: number, objection: Fault | null) {
		const slot = slots[0]!;
		const against = this.trouble ?? objection;
		if (against) return this.lack(slot, { state: 'fault', faults: [against] });
		const found = this.formula.evaluate(scope);
		if (found.state !== 'value') return this.lack(slot, found);
		const { digits } = this;
		if (typeof digits !== 'number') return this.lack(slot, { state: 'fault', faults: [digits] });
		const { si, list, type, unit: hint } = found;
		const largest = list ? largestOf(list) : si;
		try {
			const how = showing(largest, type, { unit: this.item.unit, hint });
			inUnit(largest, how);
			this.how = how;
			const manner = { type, unit: how.text, digits };
			if (list) slot.giveList(list, manner);
			else slot.give(si, manner);
		} catch (error) {
			if (!(error instanceof Refusal)) throw error;
			this.lack(slot, { state: 'fault', faults: [error.in('unit')] });
		}
	}

	private lack(slot: Slot, reason: Outcome): void {
		this.how = null;
		this.without = reason;
		slot.lack(reason.state === 'waits' ? reason.rootIds : [this.item.id]);
	}

	refresh(slots: readonly Slot[]): Refreshed | null {
		const { how, formula } = this;
		const si = formula.refresh();
		if (!how || si === null) return null;
		const slot = slots[0]!;
		if (si === slot.si) return 'stayed';
		const { sizes } = how;
		if (sizes && (Math.abs(si) < sizes.from || Math.abs(si) >= sizes.below)) return null;
		if (Math.abs(fromSi(si, how.unit)) > LARGEST) return null;
		slot.si = si;
		return 'moved';
	}

	linear(isUncertain: (slot: Slot) => boolean) {
		return [this.how && this.formula.linear(isUncertain)];
	}

	result(slots: readonly Slot[], { uses, usedIn }: ResultLinks): QuantityResult {
		const { item, symbolTex, formula } = this;
		return {
			id: item.id,
			kind: 'calculation',
			symbol: this.typedSymbol,
			tex: formula.tex,
			symbolTex,
			outcome: this.outcome(slots[0]!),
			uses,
			usedIn
		};
	}

	private outcome({ si, list, manner, uncertainty, uncertainties }: Slot): Outcome {
		const { how } = this;
		if (!how || !manner) return this.without;
		const { unit, digits } = manner;
		if (list) return { state: 'list', list: listed(list, uncertainties, how, digits) };
		return {
			state: 'value',
			quantity: {
				si,
				// The unit's own, one for all who show in it: what crosses from a worker is copied but once.
				dimension: how.unit.dimension,
				value: fromSi(si, how.unit),
				unit,
				uncertainty: uncertaintyIn(uncertainty, how.unit),
				digits
			}
		};
	}
}
