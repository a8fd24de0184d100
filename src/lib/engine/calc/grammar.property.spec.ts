/** Expressions made by the grammar itself, whole and spoilt: what is printed reads as it was, and nothing breaks. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calculation, given, lineModel, resultsOf } from './items.fixture';
import { parse } from './parse';
import { asText } from './print';

const NAMES = ['k_q', 'b_2', 'σ_d', 'Δv', 'ρ', 'line.mass', 'x', 'pi', 'Ω_max', 'mean'];
const NUMBERS = ['0', '2', '0.5', '1e3', '17.25', '3e-7'];
const UNITS = ['km', 'GPa', 'm/s^2', 'kg/m^3', 't', 'h', 'N/tex', '%', 'degC', 'km/h', 'mm²'];
/** Names that mean something to JavaScript and nothing here. */
const FOREIGN = [
	'constructor',
	'__proto__',
	'prototype',
	'toString',
	'hasOwnProperty',
	'valueOf',
	'globalThis',
	'process',
	'import',
	'eval',
	'Function',
	'undefined',
	'NaN',
	'Infinity'
];

const leaf = fc.oneof(
	fc.constantFrom(...NAMES),
	fc.constantFrom(...NUMBERS),
	fc.tuple(fc.constantFrom(...NUMBERS), fc.constantFrom(...UNITS)).map((parts) => parts.join(' '))
);
const group = (text: string) => `(${text})`;

const { expression } = fc.letrec<{ expression: string; condition: string }>((tie) => {
	const part = tie('expression');
	return {
		condition: fc.oneof(
			{ depthSize: 'small', withCrossShrink: true },
			fc
				.tuple(part, fc.constantFrom('<', '<=', '≥', '==', '!=', '≠'), part)
				.map((parts) => parts.join(' ')),
			fc
				.tuple(tie('condition'), fc.constantFrom(' and ', ' or '), tie('condition'))
				.map(([a, word, b]) => group(a) + word + group(b)),
			tie('condition').map((of) => `not ${group(of)}`)
		),
		expression: fc.oneof(
			{ depthSize: 'small', withCrossShrink: true },
			leaf,
			fc
				.tuple(part, fc.constantFrom(' + ', '-', '*', ' · ', '/', '^', ' − '), part)
				.map(([a, sign, b]) => a + sign + b),
			fc
				.tuple(part, fc.constantFrom('+', '-', '*', '/', '^'), part)
				.map(([a, sign, b]) => group(a) + sign + group(b)),
			part.map((of) => `-${group(of)}`),
			part.map((of) => `${group(of)}²`),
			fc
				.tuple(fc.constantFrom('sqrt', 'sin', 'abs', 'ln', 'expm1', 'sum', 'mean'), part)
				.map(([name, of]) => `${name}(${of})`),
			fc
				.tuple(fc.constantFrom('max', 'atan2', 'hypot', 'log'), part, part)
				.map(([name, a, b]) => `${name}(${a}, ${b})`),
			fc.tuple(tie('condition'), part, part).map(([met, yes, no]) => `(${met} ? ${yes} : ${no})`),
			fc.array(part, { minLength: 1, maxLength: 3 }).map((items) => `[${items.join(', ')}]`),
			fc.tuple(part, fc.constantFrom('1', '2', 'k_q')).map(([of, at]) => `${group(of)}[${at}]`)
		)
	};
});

const printed = (text: string): string | null => {
	try {
		return asText(parse(text).expr);
	} catch {
		return null;
	}
};

const AROUND = [
	given('k_q', '2', 'km', '0.1'),
	given('b_2', '3', 'km'),
	given('σ_d', '50', 'GPa'),
	given('Δv', '1.5'),
	given('ρ', '-4'),
	given('mean', '0.75'),
	calculation('x', '[1 km, 2 km]'),
	lineModel()
];

/** What an expression comes to, without the words of its faults, which quote it. */
function meaning(text: string): unknown {
	const result = resultsOf([...AROUND, { ...calculation('', text), id: 'it' }]).get('it');
	if (result?.kind !== 'calculation') throw new Error('No calculation.');
	const { outcome } = result;
	if (outcome.state === 'fault') return outcome.faults.map(({ code }) => code);
	if (outcome.state === 'list') return [outcome.list.si, outcome.list.dimension];
	return outcome.state === 'value' ? [outcome.quantity.si, outcome.quantity.dimension] : outcome;
}

/** Many runs on a busy machine take their time. */
const SECONDS = 60_000;

describe('an expression of the grammar', () => {
	it(
		'is printed so that it reads as it was',
		() => {
			let held = 0;
			fc.assert(
				fc.property(expression, (text) => {
					const print = printed(text);
					// Long ones are cut for the words of a fault.
					fc.pre(print !== null && !print.endsWith('…'));
					expect(printed(print!), text).toBe(print);
					expect(meaning(print!), `${text} is printed ${print}`).toEqual(meaning(text));
					held += 1;
				}),
				{ numRuns: 800 }
			);
			expect(held).toBeGreaterThan(400);
		},
		SECONDS
	);

	const spoilt = fc
		.tuple(
			expression,
			fc.array(
				fc.tuple(
					fc.nat(),
					fc.oneof(
						fc.constantFrom(...FOREIGN, '.constructor', '["constructor"]', '[__proto__]', '.'),
						fc.constantFrom(...'+-*/^()[],?:<>=!%{};"\'`\\$#@&| \u202f²½°'),
						leaf,
						fc.constant('')
					),
					fc.nat(3)
				),
				{ maxLength: 3 }
			)
		)
		.map(([text, edits]) =>
			edits.reduce((now, [at, put, cut]) => {
				const from = at % (now.length + 1);
				return now.slice(0, from) + put + now.slice(from + cut);
			}, text)
		);

	it(
		'spoilt here and there is answered in words that point into the text',
		() => {
			const polluted = Object.getOwnPropertyNames(Object.prototype).length;
			fc.assert(
				fc.property(spoilt, (text) => {
					const results = resultsOf([...AROUND, { ...calculation('', text), id: 'spoilt' }]);
					const result = results.get('spoilt');
					if (result?.kind !== 'calculation') throw new Error('No calculation.');
					const { outcome } = result;
					if (outcome.state !== 'fault') return;
					expect(outcome.faults.length).toBeGreaterThan(0);
					for (const { message, span } of outcome.faults) {
						expect(message, text).toMatch(/^\S.*[.?”]$/su);
						if (!span) continue;
						expect(span.from, text).toBeGreaterThanOrEqual(0);
						expect(span.to, text).toBeGreaterThan(span.from);
						expect(span.to, text).toBeLessThanOrEqual(text.length);
					}
				}),
				{ numRuns: 1500 }
			);
			expect(Object.getOwnPropertyNames(Object.prototype)).toHaveLength(polluted);
		},
		SECONDS
	);

	it.each(FOREIGN)('finds nothing behind %s', (name) => {
		for (const text of [
			name,
			`${name}()`,
			`${name}(1)`,
			`a.${name}`,
			`[1][${name}]`,
			`x.${name}`
		]) {
			const found = resultsOf([
				given('a', '1'),
				calculation('x', '[1, 2]'),
				calculation('y', text)
			]);
			expect(found.get('y'), text).toMatchObject({ outcome: { state: 'fault' } });
		}
	});
});
