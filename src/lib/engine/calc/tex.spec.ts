import fc from 'fast-check';
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { calculation, given, lineModel, quantityOf } from './items.fixture';
import { nameTex, symbolTex, unitTex } from './tex';

const set = (tex: string) => katex.renderToString(tex, { throwOnError: true, strict: 'error' });

describe('a symbol in TeX', () => {
	it.each([
		['σ_d', '\\sigma_\\mathrm{d}'],
		['m_lift', 'm_\\mathrm{lift}'],
		['FS', '\\mathit{FS}'],
		['A_0', 'A_0'],
		['m_L_b', 'm_\\mathrm{L,b}'],
		['rho', '\\mathit{rho}'],
		['Λ', '\\Lambda'],
		['Δr', '{\\Delta r}'],
		['Δv', '{\\Delta v}'],
		['ρ_0', '\\rho_0'],
		['ΔT_1', '{\\Delta T}_1'],
		['ℬ_ℂ', '\\text{B}_\\mathrm{\\text{C}}'],
		['x', 'x']
	])('%s is %s', (symbol, tex) => {
		expect(symbolTex(symbol)).toBe(tex);
		set(tex);
	});

	it('of a line model has the symbol of its quantity', () => {
		expect(nameTex('line.mass')).toBe('\\mathit{line}{.}m_\\mathrm{L}');
		set(nameTex('line.mass'));
	});

	it('can carry no command, whatever letters it is made of', () => {
		const letter = fc.oneof(
			fc.constantFrom('_', 'a', 'σ', 'Ω', 'ß', '漢', 'é', 'ж', '1'),
			fc.string({ unit: 'grapheme', minLength: 1, maxLength: 1 })
		);
		fc.assert(
			fc.property(fc.array(letter, { minLength: 1, maxLength: 12 }), (letters) => {
				const { symbolTex: tex } = quantityOf(
					[{ ...given('x', '1'), symbol: letters.join('') }],
					'x'
				);
				expect(tex).not.toMatch(/\\(def|href|html|url|includegraphics|let|gdef)/);
				if (tex) katex.renderToString(tex, { throwOnError: true, strict: false });
			})
		);
	});
});

describe('a formula in TeX', () => {
	const formula = (expression: string) =>
		quantityOf([lineModel(), calculation('result', expression)], 'result').tex;

	it.each([
		['σ_al/FS', '\\sigma_\\mathrm{al}/\\mathit{FS}'],
		['m*g*(1 + n)', 'm\\,g\\,(1 + n)'],
		['a/(b*c)', 'a/(b\\,c)'],
		['a - (b - c)', 'a - (b - c)'],
		['a - b - c', 'a - b - c'],
		['(a + b)^2', '(a + b)^{2}'],
		['x_1^2', 'x_1^{2}'],
		['2 x', '2\\,x'],
		['x*2', 'x \\cdot 2'],
		['3 km * x', '3\\,\\mathrm{km} \\cdot x'],
		['9.81 m/s^2', '9.81\\,\\mathrm{m}/\\mathrm{s}^{2}'],
		['exp(-k*t)', '\\exp(-k\\,t)'],
		['sqrt(a + b)', '\\sqrt{a + b}'],
		['1.2e-3', '0.0012'],
		['1e-12', '10^{-12}'],
		['100 000 km', '100\\,000\\,\\mathrm{km}'],
		['a <= b ? 1 : 2', '1\\ \\text{if}\\ a \\le b,\\ \\text{otherwise}\\ 2'],
		['line.taper*2', '\\mathit{line}{.}\\tau \\cdot 2'],
		['earth.GM/earth.radius', 'GM_\\mathrm{earth}/R_\\mathrm{earth}'],
		['-(a + b)', '-(a + b)'],
		['12 %', '12\\,\\%'],
		['20 degC', '20\\,^\\circ\\mathrm{C}']
	])('%s is %s', (expression, tex) => {
		expect(formula(expression)).toBe(tex);
		set(tex);
	});

	it('sets every unit so that KaTeX takes it', () => {
		for (const unit of ['kg/m^3', 'µm', 'ohm', 'arcsec', 'sidereal day', 'W/(m K)', 'm s⁻²', '%']) {
			set(unitTex(unit));
		}
	});
});
