/** A line model in the sheet: its symbol is no quantity, its outputs are. */
import { slopesOf } from '../numerics/slope';
import type { Entry, ResultLinks } from './entry';
import { Formula } from './formula';
import { valueType } from './value-type';
import type { LineModelItem } from './items';
import { joined, type Derived } from './linear';
import { evaluateLineModel, fieldsRead, outputsAt, type ModelFormulas } from './line-model';
import { MODEL_FIELDS, type ModelField, type ModelValues } from './model-inputs';
import { OUTPUTS } from './model-outputs';
import { withUncertainty } from './quantity';
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
	private slopes = new Map<ModelField, readonly number[]>();
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
		this.slopes.clear();
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

	/** Exact through the expressions of its inputs, by differences through the model. */
	linear(isUncertain: (slot: Slot) => boolean): (Derived | null)[] {
		const parts: Derived[] = [];
		const slopes: (readonly number[])[] = [];
		for (const field of fieldsRead(this.item)) {
			const part = this.formulas[field].linear(isUncertain);
			if (!part) continue;
			parts.push(part);
			slopes.push(this.slopesBy(field));
		}
		const outputs = this.model!.outputs.map(({ outcome }, output) => {
			if (parts.length === 0 || outcome.state !== 'value') return null;
			return joined(
				parts,
				slopes.map((by) => by[output]!)
			);
		});
		return [null, ...outputs];
	}

	/** Of each output by a field, kept as long as the figures are those for which it was found. */
	private slopesBy(field: ModelField): readonly number[] {
		const values = Object.fromEntries(
			fieldsRead(this.item).map((name) => {
				const { outcome } = this.formulas[name];
				return [name, outcome.state === 'value' ? outcome.si : null];
			})
		) as ModelValues;
		const found =
			this.slopes.get(field) ??
			slopesOf((x) => outputsAt(this.item, { ...values, [field]: x }), values[field]!);
		this.slopes.set(field, found);
		return found;
	}

	result(slots: readonly Slot[], links: ResultLinks): LineModelResult {
		const { item } = this;
		const model = this.model!;
		const outputs = model.outputs.map((output, i) => ({
			...output,
			outcome: withUncertainty(output.outcome, slots[i + 1]!.uncertainty)
		}));
		return {
			id: item.id,
			kind: 'lineModel',
			symbol: item.symbol.trim(),
			...model,
			outputs,
			...links
		};
	}
}
