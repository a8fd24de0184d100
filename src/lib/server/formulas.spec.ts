import { expect, test } from 'vitest';
import { setFormulas } from './formulas';

test('every formula of a page is set once, wherever it stands', () => {
	const set = setFormulas({
		results: [{ symbolTex: '\\rho', tex: 'm/V', outputs: [{ symbolTex: '\\tau' }] }],
		content: { items: [{ body: { content: [{ type: 'formula', attrs: { tex: 'a^2' } }] } }] },
		symbols: { 'item-1': '\\rho', 'item-2': '\\eta' },
		parts: [
			{
				tokens: [
					{ kind: 'formula', text: '\\pi' },
					{ kind: 'word', text: 'tape' }
				]
			}
		]
	});
	expect(Object.keys(set).sort()).toEqual(['\\eta', '\\pi', '\\rho', '\\tau', 'a^2', 'm/V']);
	expect(set['\\rho']).toContain('class="katex"');
});

test('a formula cannot bring markup or a link of its own', () => {
	const tex = '\\href{javascript:alert(1)}{x}\\text{<img src=x onerror=alert(1)>}';
	const html = setFormulas({ tex })[tex];
	expect(html).not.toContain('<img');
	expect(html).not.toContain('<a ');
});
