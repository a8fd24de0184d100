/**
 * Symbols, numbers and units in TeX for KaTeX. Symbols are italic with upright indices, units upright.
 * A name is letters, digits and _ only (see `names`), so no command can come from one.
 */
import { unitText } from '../quantities/format';
import { OUTPUT_TEX } from './model-outputs';

const GREEK: Record<string, string> = Object.fromEntries(
	(
		'α alpha β beta γ gamma δ delta ε varepsilon ϵ epsilon ζ zeta η eta θ theta ϑ vartheta ι iota κ kappa ' +
		'λ lambda μ mu ν nu ξ xi π pi ϖ varpi ρ rho ϱ varrho σ sigma ς varsigma τ tau υ upsilon φ varphi ϕ phi ' +
		'χ chi ψ psi ω omega Γ Gamma Δ Delta Θ Theta Λ Lambda Ξ Xi Π Pi Σ Sigma Υ Upsilon Φ Phi Ψ Psi Ω Omega'
	)
		.split(' ')
		.flatMap((word, i, words) => (i % 2 === 0 ? [[word, `\\${words[i + 1]}`]] : []))
);

/** σ_d → \sigma_\mathrm{d}, m_lift → m_\mathrm{lift}, FS → \mathit{FS}, line.mass → \mathit{line}.m_\mathrm{L}. */
export function nameTex(name: string): string {
	const [model, output] = name.split('.');
	if (output !== undefined) {
		return `${symbolTex(model!)}{.}${OUTPUT_TEX[output] ?? `\\mathrm{${upright(output)}}`}`;
	}
	return symbolTex(name);
}

export function symbolTex(symbol: string): string {
	const [base, ...indices] = symbol.split('_');
	const index = indices.filter(Boolean);
	const body = baseTex(base!);
	if (index.length === 0) return body;
	const all = index.join(',');
	return /^\d$/.test(all) ? `${body}_${all}` : `${body}_\\mathrm{${upright(all)}}`;
}

function baseTex(base: string): string {
	const letters = [...base];
	if (letters.length === 1) return GREEK[base] ?? (isLatin(base) ? base : textTex(base));
	if (letters.every((letter) => isLatin(letter))) return `\\mathit{${base}}`;
	return `{${letters.map((letter) => GREEK[letter] ?? (isLatin(letter) ? letter : textTex(letter))).join(' ')}}`;
}

/** Script and double-struck letters are commands to KaTeX, which it does not know inside \\text: there they are plain. */
const textTex = (letter: string) =>
	`\\text{${letter.replace(/[\u2100-\u214f\u{1d6a4}]/gu, (sign) => sign.normalize('NFKC'))}}`;

const isLatin = (letter: string) => /^[A-Za-z0-9]$/.test(letter);

/** Letters inside \mathrm: Greek by command, other scripts as text, _ as a thin gap. */
const upright = (text: string) =>
	[...text]
		.map((letter) => {
			if (GREEK[letter]) return `${GREEK[letter]} `;
			if (letter === '_') return '\\,';
			return /[\dA-Za-z,]/.test(letter) ? letter : textTex(letter);
		})
		.join('');

/** A number as it stands in an expression: all its digits, thousands set apart. */
export function numberTex(value: number): string {
	const [mantissa, exponent] = String(value).split('e');
	const [whole, decimals] = mantissa!.split('.');
	const grouped = whole!.replace(/\B(?=(\d{3})+$)/g, '\\,');
	const digits = decimals === undefined ? grouped : `${grouped}.${decimals}`;
	if (exponent === undefined) return digits;
	return `${digits === '1' ? '' : `${digits} \\times `}10^{${Number(exponent)}}`;
}

const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const SIGNS: Record<string, string> = {
	'·': '{\\cdot}',
	'°': '^\\circ',
	'%': '\\%',
	µ: '\\mu ',
	μ: '\\mu ',
	Ω: '\\Omega',
	'′': '^\\prime',
	'″': '^{\\prime\\prime}',
	' ': '\\ '
};

/** A unit, upright: kg/m^3 → \mathrm{kg}/\mathrm{m}^{3}. Only signs that units have come through. */
export function unitTex(unit: string): string {
	return unitText(unit).replace(/[A-Za-z]+|⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+|[^]/gu, (piece) => {
		if (/^[A-Za-z]/.test(piece)) return `\\mathrm{${piece}}`;
		if (/^[⁻⁰¹²³⁴⁵⁶⁷⁸⁹]/.test(piece)) {
			const digits = [...piece].map((sign) => (sign === '⁻' ? '-' : RAISED.indexOf(sign)));
			return `^{${digits.join('')}}`;
		}
		return SIGNS[piece] ?? (/[\d/()]/.test(piece) ? piece : '');
	});
}
