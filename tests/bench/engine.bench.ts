/**
 * The engine against mathjs computing with its own units, in one run: a chain of 300 calculations, each
 * shown in GPa, whose first given is edited. The summary prints how the two compare.
 */
import { all, create, type Unit } from 'mathjs';
import { bench, describe } from 'vitest';
import type { SheetItem } from '../../src/lib/engine/calc/items';
import { createSheet } from '../../src/lib/engine/calc/sheet';

const LENGTH = 300;

const names = Array.from({ length: LENGTH }, (_, i) => `q_${i}`);
const expressions = names.map((_, i) =>
	i === 0 ? 'σ_al / 2 + 1 MPa' : `${names[i - 1]} * 1.001 + ${i} kPa`
);

const given = (value: number): SheetItem => ({
	id: 'given',
	kind: 'given',
	symbol: 'σ_al',
	value: String(value),
	unit: 'GPa',
	uncertainty: ''
});

const calculations = names.map((symbol, i): SheetItem => ({
	id: symbol,
	kind: 'calculation',
	symbol,
	expression: expressions[i]!,
	unit: 'GPa',
	digits: ''
}));
const note = { upsert: [given(100), ...calculations], order: ['given', ...names] };

describe(`an edit of the first given of ${LENGTH} chained calculations`, () => {
	const sheet = createSheet();
	sheet.apply(note);
	let value = 100;
	bench('the engine', () => {
		const { changed } = sheet.apply({ upsert: [given(++value)] });
		if (changed.length !== LENGTH + 1)
			throw new Error(`It reached ${changed.length} results only.`);
	});

	const math = create(all!);
	const compiled = expressions.map((expression) => math.compile(expression));
	bench('mathjs with its units', () => {
		const scope = new Map<string, unknown>([['σ_al', math.unit(++value, 'GPa')]]);
		compiled.forEach((code, i) => {
			const result = code.evaluate(scope) as Unit;
			scope.set(names[i]!, result);
			result.to('GPa').toNumber('GPa');
		});
	});
});

describe(`a note of ${LENGTH} calculations`, () => {
	bench('loaded whole', () => {
		createSheet().apply(note);
	});
});
