/**
 * The sheet's speed, and mathjs computing with its own units in the same run: the summary prints how they
 * compare. A chain of calculations, each shown in GPa, whose first given is edited.
 *
 * What is aimed at: at least 50 times mathjs's speed and at most 2 ms for the first given of 300, at most
 * 0.2 ms for a leaf, ten times as long for ten times as many, 20 ms for uncertainties.
 */
import { all, create, type Unit } from 'mathjs';
import { bench, describe } from 'vitest';
import type { SheetItem } from '../../src/lib/engine/calc/items';
import { createSheet } from '../../src/lib/engine/calc/sheet';

const given = (value: number, symbol = 'σ_al', uncertainty = ''): SheetItem => ({
	id: symbol,
	kind: 'given',
	symbol,
	value: String(value),
	unit: 'GPa',
	uncertainty
});

const calculation = (symbol: string, expression: string): SheetItem => ({
	id: symbol,
	kind: 'calculation',
	symbol,
	expression,
	unit: 'GPa',
	digits: ''
});

const expressionsOf = (length: number) =>
	Array.from({ length }, (_, i) =>
		i === 0 ? 'σ_al / 2 + 1 MPa' : `q_${i - 1} * 1.001 + ${i} kPa`
	);

const noteOf = (length: number, givens = [given(100)]) => {
	const upsert = [
		...givens,
		...expressionsOf(length).map((text, i) => calculation(`q_${i}`, text))
	];
	return { upsert, order: upsert.map(({ id }) => id) };
};

const sheetOf = (length: number) => {
	const sheet = createSheet();
	sheet.apply(noteOf(length));
	return sheet;
};

/** Three digits each, as somebody would type them. */
let typed = 100;
const another = () => (typed = typed === 999 ? 100 : typed + 1);

const math = create(all!);
const compiled = expressionsOf(300).map((text) => math.compile(text));

function mathjsWithUnits(value: number): number[] {
	const scope = new Map<string, unknown>([['σ_al', math.unit(value, 'GPa')]]);
	return compiled.map((code, i) => {
		const result = code.evaluate(scope) as Unit;
		scope.set(`q_${i}`, result);
		return result.to('GPa').toNumber('GPa');
	});
}

/** Both compute the same, or their times say nothing. */
function mustAgree() {
	const sheet = sheetOf(300);
	sheet.apply({ upsert: [given(123)] });
	const figures = sheet
		.results()
		.flatMap((result) =>
			result.kind === 'calculation' && result.outcome.state === 'value'
				? [result.outcome.quantity.value]
				: []
		);
	mathjsWithUnits(123).forEach((value, i) => {
		if (!(Math.abs(figures[i]! / value - 1) < 1e-9)) throw new Error(`They differ in q_${i}.`);
	});
}

describe('the first given of 300 chained calculations is edited', () => {
	mustAgree();
	const sheet = sheetOf(300);
	bench('the engine, all figures', () => {
		sheet.apply({ upsert: [given(another())] });
	});
	bench('the engine, all figures and all results', () => {
		const { changed } = sheet.apply({ upsert: [given(another())] });
		if (changed.length !== 301) throw new Error(`It changed ${changed.length} results only.`);
	});
	bench('the engine, all results copied as to the page', () => {
		structuredClone(sheet.apply({ upsert: [given(another())] }).changed);
	});
	bench('mathjs with its units', () => {
		mathjsWithUnits(another());
	});
});

// From 300 to 3 000 what an edit touches leaves the nearest cache, once; from there on it is in proportion.
describe('the first given of more and more chained calculations is edited, all figures', () => {
	for (const length of [300, 3000, 6000]) {
		const sheet = sheetOf(length);
		bench(`${length}`, () => {
			sheet.apply({ upsert: [given(another())] });
		});
	}
});

describe('a leaf is edited, its result read', () => {
	for (const length of [300, 3000]) {
		const sheet = sheetOf(length);
		bench(`of ${length}`, () => {
			const expression = `q_${length - 2} * 1.001 + ${another()} kPa`;
			const { changed } = sheet.apply({ upsert: [calculation(`q_${length - 1}`, expression)] });
			if (changed.length !== 1) throw new Error(`It changed ${changed.length} results.`);
		});
	}
});

describe('standard uncertainties of 300 calculations by 20 uncertain givens', () => {
	const others = Array.from({ length: 19 }, (_, i) => given(1 + i, `u_${i}`, '0.1'));
	const sheet = createSheet();
	const note = noteOf(300, [given(100, 'σ_al', '2'), ...others]);
	const mixed = note.upsert.map((item, i) =>
		item.kind === 'calculation'
			? { ...item, expression: `${item.expression} + σ_al * sin(σ_al / u_${i % 19}) / 100` }
			: item
	);
	sheet.apply({ ...note, upsert: mixed });
	bench('after an edit of the first given', () => {
		sheet.apply({ upsert: [given(another(), 'σ_al', '2')] });
		if (sheet.uncertainties().length === 0) throw new Error('No uncertainty followed.');
	});
});

describe('a note of 300 calculations', () => {
	const note = noteOf(300);
	bench('loaded whole, with results', () => {
		if (createSheet().apply(note).changed.length !== 301) throw new Error('Results are missing.');
	});
});
