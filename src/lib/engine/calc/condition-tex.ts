/** The condition of a check with its figures: σ_d = 50.0 ≤ σ_j = 47.2 GPa. */
import { figureTex } from '../quantities/format';
import type { Formula } from './formula';
import type { Outcome } from './results';
import { unitTex } from './tex';

type Parts = Record<'left' | 'right' | 'tolerance', Formula>;
type Figures = { left: Outcome; right: Outcome; tolerance: Outcome | null; unit: string };

const SIGN = { le: '\\le', ge: '\\ge', within: '=' };

/** Without figures where a side has none. */
export function conditionTex(
	relation: keyof typeof SIGN,
	parts: Parts,
	figures: Figures | null
): string {
	const side = (name: 'left' | 'right' | 'tolerance') => {
		const formula = parts[name];
		const tex = formula.tex || '\\ldots';
		const outcome = figures?.[name];
		if (outcome?.state !== 'value') return tex;
		const { value, digits } = outcome.quantity;
		const figure = figureTex(value, digits);
		return formula.isFigure ? figure : `${tex} = ${figure}`;
	};
	const unit = figures?.unit ? `\\,${unitTex(figures.unit)}` : '';
	if (relation !== 'within')
		return `${side('left')} \\ ${SIGN[relation]}\\  ${side('right')}${unit}`;
	const band = `${side('right')} \\pm ${side('tolerance')}`;
	return `${side('left')} \\ \\text{within}\\  ${unit ? `(${band})${unit}` : band}`;
}
