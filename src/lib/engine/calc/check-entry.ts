/** A check in the sheet. It defines nothing. */
import {
	UNCERTAIN,
	decideCheck,
	evaluateParts,
	linearParts,
	refreshParts,
	type CheckFormulas,
	type Uncertain
} from './check';
import type { Entry, Refreshed, ResultLinks } from './entry';
import { Formula } from './formula';
import type { CheckItem } from './items';
import type { Derived } from './linear';
import type { CheckResult } from './results';
import type { Scope } from './scope';
import type { Slot } from './slot';

export class CheckEntry implements Entry {
	readonly symbol = '';
	readonly defines: readonly string[] = [];
	readonly mentions: readonly string[];
	/** Nothing names them: they hold uncertainties. */
	readonly width = UNCERTAIN.length;
	private formulas: CheckFormulas;
	private thinLimit = 0;

	constructor(readonly item: CheckItem) {
		this.formulas = {
			left: new Formula(item.left, 'left'),
			right: new Formula(item.right, 'right'),
			tolerance: new Formula(item.relation === 'within' ? item.tolerance : '', 'tolerance'),
			required: new Formula(item.required, 'required')
		};
		const mentions = Object.values(this.formulas).flatMap(({ mentions }) => mentions);
		this.mentions = [...new Set(mentions)];
	}

	evaluate(_slots: readonly Slot[], scope: Scope, thinLimit: number): void {
		this.thinLimit = thinLimit;
		evaluateParts(this.item, this.formulas, scope);
	}

	refresh(): Refreshed | null {
		return refreshParts(this.item, this.formulas);
	}

	linear(isUncertain: (slot: Slot) => boolean): (Derived | null)[] {
		return linearParts(this.item, this.formulas, isUncertain);
	}

	result(slots: readonly Slot[], links: ResultLinks): CheckResult {
		const uncertain = Object.fromEntries(
			UNCERTAIN.map((name, i) => [name, slots[i]!.uncertainty])
		) as Uncertain;
		const body = decideCheck(this.item, this.formulas, this.thinLimit, uncertain);
		return { id: this.item.id, kind: 'check', ...body, ...links };
	}
}
