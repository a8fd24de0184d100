/** Texts that nobody means well: the sheet answers each in words, and in time. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calculation, given, lineModel, resultsOf } from './items.fixture';

const PIECES = [
	'a',
	'σ_d',
	'2',
	'1.5',
	'1e3',
	'+',
	'-',
	'*',
	'/',
	'^',
	'(',
	')',
	',',
	'?',
	':',
	'<',
	'<=',
	'==',
	'=',
	'!',
	'%',
	'.',
	' ',
	'km',
	'm/s^2',
	'sin',
	'sqrt(',
	'and',
	'not',
	'to',
	'in',
	'²',
	'·',
	'−',
	'"',
	"'",
	'[',
	']',
	'{',
	'}',
	';',
	'#',
	'$0',
	'$',
	'\\',
	'@',
	'__proto__',
	'constructor',
	'line.mass',
	'line',
	'earth.GM',
	'0x1F',
	'e',
	'pi',
	'null',
	'true',
	'function',
	'=>',
	'\n',
	'\u202f',
	'\0',
	'🚀',
	'%%',
	'..'
];

const text = fc.oneof(
	fc.array(fc.constantFrom(...PIECES), { maxLength: 14 }).map((pieces) => pieces.join('')),
	fc.string({ unit: 'grapheme', maxLength: 40 }),
	fc.string({ unit: 'binary', maxLength: 40 })
);

function plain(value: unknown): void {
	if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true);
	else if (typeof value === 'object' && value) Object.values(value).forEach(plain);
	else if (typeof value === 'string') expect(value).not.toMatch(/NaN|Infinity|undefined|\[object/);
}

/** Many runs on a busy machine take their time. */
const SECONDS = 60_000;

describe('random text in every field', () => {
	it(
		'never throws and never reads NaN',
		() => {
			fc.assert(
				fc.property(text, text, text, (one, two, three) => {
					fc.pre(![one, two, three].some((text) => /NaN|Infinity|undefined|\[object/.test(text)));
					const results = resultsOf([
						given('a', '2', 'km'),
						calculation('σ_d', '5 GPa'),
						{ ...given('', one, two, three), id: 'given' },
						{ ...calculation('', one, two, three), id: 'calculation' },
						{ ...given(one, '1'), id: 'symbol' },
						{
							id: 'check',
							kind: 'check',
							left: one,
							relation: 'within',
							right: two,
							tolerance: three,
							required: two
						},
						lineModel({ density: one, lift: two, reserve: three })
					]);
					for (const result of results.values()) {
						plain({ ...result, symbol: '', tex: '', symbolTex: '' });
					}
				}),
				{ numRuns: 300 }
			);
		},
		SECONDS
	);
});

describe('a text as long as allowed', () => {
	it.each([
		['parentheses', '('.repeat(4000)],
		['signs', '-'.repeat(3999) + '1'],
		['powers', '2^'.repeat(1999) + '2'],
		['conditions', '1?'.repeat(1999) + '1'],
		['one name', 'x'.repeat(4000)],
		['many names', 'a '.repeat(2000)],
		['digits', '9'.repeat(4000)],
		['digit groups', '999 '.repeat(1000)],
		['units', '1 ' + 'm '.repeat(1999)],
		['divisions of units', '1 m' + '/m'.repeat(1900)],
		['unit groups', '1 m' + '/(m'.repeat(1300)],
		['calls in calls', 'max('.repeat(99) + '1' + ',1)'.repeat(99)],
		['choices in choices', '(1>0?'.repeat(90) + '1' + ':1)'.repeat(90)],
		['brackets', '['.repeat(4000)],
		['lists', `[${'1,'.repeat(1990)}1]`],
		['places', 'x' + '[1]'.repeat(1300)],
		['sums of lists', 'sum([1,2]+'.repeat(90) + '1' + ')'.repeat(90)],
		['commas', 'max(' + '1,'.repeat(1990) + '1)'],
		['superscripts', '2' + '²'.repeat(3999)],
		['spaces', ' '.repeat(4000)]
	])('of %s is answered within half a second', (_, expression) => {
		const start = performance.now();
		resultsOf([
			calculation('x', expression),
			{ ...given('y', '1', expression.slice(0, 4000)), id: 'u' }
		]);
		expect(performance.now() - start).toBeLessThan(500);
	});
});

describe('a long chain', () => {
	it('of five thousand calculations is evaluated without exhausting the stack', () => {
		const items = Array.from({ length: 5000 }, (_, i) =>
			calculation(`x_${i}`, i === 0 ? 'a' : `x_${i - 1} + 1`)
		);
		expect(resultsOf([given('a', '1', '', '0.5'), ...items]).get('x_4999')).toMatchObject({
			outcome: { quantity: { si: 5000, uncertainty: 0.5 } }
		});
	});
});
