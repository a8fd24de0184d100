/** A line model in the sheet: its symbol is no quantity, its outputs are. */
import type { Entry, ResultLinks } from './entry';
import { Formula } from './formula';
import { valueType } from './infer';
import type { LineModelItem } from './items';
import { MODEL_FIELDS, evaluateLineModel, fieldsRead, type ModelFormulas } from './line-model';
import { OUTPUTS } from './model-outputs';
import type { Fault, LineModelResult } from './results';
import type { Scope } from './scope';
import type { Slot } from './slot';
import { readSymbol } from './symbol';

type ModelBody = ReturnType<typeof evaluateLineModel>;

export class ModelEntry implements Entry {
	readonly symbol: string;
	readonly defines: readonly string[];
	readonly mentions: readonly string[];
	readonly width = 1 + OUTPUTS.length;
	private trouble: Fault | null;
	private formulas: ModelFormulas;
	private model: ModelBody | null = null;

	constructor(readonly item: LineModelItem) {
		({ symbol: this.symbol, trouble: this.trouble } = readSymbol(item.symbol));
		const { symbol } = this;
		this.formulas = Object.fromEntries(
			MODEL_FIELDS.map((field) => [field, new Formula(item[field], field)])
		) as ModelFormulas;
		this.defines = symbol === '' ? [] : [symbol, ...OUTPUTS.map(({ name }) => `${symbol}.${name}`)];
		const mentions = fieldsRead(item).flatMap((field) => this.formulas[field].mentions);
		this.mentions = [...new Set(mentions)];
	}

	evaluate(slots: readonly Slot[], scope: Scope, _thinLimit: number, objection: Fault | null) {
		const { item, formulas } = this;
		this.model = evaluateLineModel(item, formulas, scope, this.trouble ?? objection);
		this.model.outputs.forEach(({ outcome }, i) => {
			const slot = slots[i + 1]!;
			if (outcome.state === 'value') {
				const { si, unit, digits } = outcome.quantity;
				slot.give(si, { type: valueType(OUTPUTS[i]!.dimension), unit, digits });
			} else slot.lack(outcome.state === 'waits' ? outcome.rootIds : [item.id]);
		});
	}

	/** Its figures are too dear to be found twice: first to see whether they stand, then in full. */
	refresh = () => null;

	result(_slots: readonly Slot[], links: ResultLinks): LineModelResult {
		const { item, model } = this;
		return { id: item.id, kind: 'lineModel', symbol: item.symbol.trim(), ...model!, ...links };
	}
}
