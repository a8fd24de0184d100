import { describe, expect, it } from 'vitest';
import { calculation, evaluated, faultOf, given, quantityOf } from './items.fixture';

describe('an expression', () => {
	it.each([
		['2 + 3*4', '14'],
		['2^3^2', '512'],
		['-2^2', '-4'],
		['1/2/2', '0.25'],
		['2(3 + 4)', '14'],
		['sqrt(2)^2', '2'],
		['cbrt(27)', '3'],
		['exp(1) - e', '0'],
		['ln(e^3)', '3'],
		['log(8, 2)', '3'],
		['log10(1000)', '3'],
		['sin(30 deg)', '0.5'],
		['atan2(1, 1)', '0.785398163397'],
		['max(1, 2, 3) - min(1, 2, 3)', '2'],
		['hypot(3 m, 4 m)', '5 m'],
		['erf(0)', '0'],
		['round(2.5)', '3'],
		['3 < 4 ? 1 : 2', '1'],
		['1 < 2 and not (2 < 1) ? 1 : 2', '1'],
		['1 < 2 < 3 ? 1 : 2', '1'],
		['3 ≥ 4 or 3 ≠ 4 ? 1 : 2', '1'],
		['2 × 3 · 4', '24'],
		['5 − 2', '3'],
		['3²', '9'],
		['2⁻¹', '0.5'],
		['100 000 / 10', '10000'],
		['12 % * 50', '6'],
		['1 > 5 % and 2 > 1 ? 3 : 4', '3'],
		['max(2^2/pi, 3 %) * pi', '4'],
		['(2/pi) * 50 % * pi', '1'],
		['pi', '3.14159265359'],
		['π/pi', '1'],
		['g_0', '9.80665 m/s^2'],
		['earth.radius', '6378.137 km']
	])('%s is %s', (expression, value) => expect(evaluated(expression)).toBe(value));

	it('holds a number and its unit together', () => {
		expect(evaluated('100 km / 200 km/h', [], 'h')).toBe('0.5 h');
		expect(evaluated('9.81 m/s^2 * 2 s')).toBe('19.62 m/s');
		expect(evaluated('3 km^2', [], 'km^2')).toBe('3 km^2');
		expect(evaluated('1300 kg·m⁻³')).toBe('1300 kg·m⁻³');
		expect(evaluated('2 kJ/(kg K) * 3 K')).toBe('6 kJ/kg');
		expect(evaluated('1 sidereal day', [], 's')).toBe('86164.0905 s');
	});

	it('uses the quantities of the note', () => {
		const givens = [given('σ_al', '100', 'GPa'), given('FS', '2'), given('A', '2', 'mm^2')];
		expect(evaluated('σ_al/FS', givens)).toBe('50 GPa');
		expect(evaluated('100 kN / A', givens)).toBe('50 GPa');
		expect(evaluated('2 FS', givens)).toBe('4');
	});

	it('takes the micro sign and the letter mu for one name', () => {
		expect(evaluated('2*\u03bc', [given('\u00b5', '3')])).toBe('6');
	});

	it('shows its value in the unit that was chosen', () => {
		expect(evaluated('1 N/tex * 1300 kg/m^3', [], 'GPa')).toBe('1.3 GPa');
		expect(evaluated('0.944', [], '%')).toBe('94.4 %');
	});
});

describe('temperatures', () => {
	it('on a scale with its own zero keep apart from differences', () => {
		expect(evaluated('20 degC + 5 K')).toBe('25 degC');
		expect(evaluated('30 degC - 20 degC')).toBe('10 K');
		expect(evaluated('300 K', [], 'degC')).toBe('26.85 degC');
	});

	it('are not added, and a difference is not shown on such a scale', () => {
		expect(faultOf('20 degC + 5 degC').message).toContain('have no sum');
		expect(faultOf('30 degC - 20 degC', [], 'degC').message).toContain(
			'difference of temperatures'
		);
	});

	// 20 °C = 293.15 K and a kelvin is as long as a degree Celsius: SI Brochure, 2.3.1; 68 °F = 20 °C: NIST SP 811, B.8.
	const T1 = given('T_1', '20', 'degC');
	const T2 = given('T_2', '86', 'degF');
	const T3 = given('T_3', '300', 'K');

	it('have differences, and differences have multiples', () => {
		expect(evaluated('T_2 - T_1', [T1, T2])).toBe('10 K');
		expect(evaluated('2*(T_2 - T_1)', [T1, T2])).toBe('20 K');
		expect(evaluated('T_1 + (T_2 - T_1)/2', [T1, T2])).toBe('25 degC');
		expect(evaluated('mean(T_1, T_2)', [T1, T2])).toBe('25 degC');
		expect(evaluated('T_3 - T_1', [T1, T3])).toBe('6.85 K');
	});

	it('may lie below the zero of their scale', () => {
		expect(evaluated('-20 degC')).toBe('-20 degC');
		expect(evaluated('5 degC - -20 degC')).toBe('25 K');
	});

	it('are shown on any scale', () => {
		expect(evaluated('T_1', [T1], 'K')).toBe('293.15 K');
		expect(evaluated('T_1', [T1], 'degF')).toBe('68 degF');
		expect(evaluated('T_1 + 5 K', [T1], 'degF')).toBe('77 degF');
	});

	it('stand for their kelvins in a product that is no temperature', () => {
		expect(evaluated('T_1/T_3', [T1, T3])).toBe('0.977166666667');
		// σ T⁴ at 20 °C: 5.670374e-8 × 293.15⁴ = 418.77 W/m², by hand.
		const radiated = calculation('M', '5.670374e-8 W/(m^2 K^4) * T_1^4', 'W/m^2');
		expect(quantityOf([T1, radiated], 'M').outcome).toMatchObject({
			quantity: { value: expect.closeTo(418.77, 1) }
		});
		expect(evaluated('2 * 293.15 K')).toBe('586.3 K');
	});

	it.each(['2*T_1', 'T_1*2', 'T_1/2', '-T_1', '2*(20 degC)', '5 % * T_1'])(
		'on a scale with its own zero have no multiples: %s',
		(expression) => {
			const { message, remedy } = faultOf(expression, [T1]);
			expect(message).toContain('has no multiples');
			expect(remedy).toContain('Give the temperature in K');
		}
	);

	it.each([
		['(T_2 - T_1) - T_1', 'it is a temperature; T_2 − T_1 before it is a difference'],
		['hypot(T_1, T_2)', 'have no sum'],
		['T_1 > 0 ? 1 : 2', 'may be that of any scale'],
		['max(0, T_1)', 'may be that of any scale'],
		['T_1 > T_2 - T_1 ? 1 : 2', 'difference of temperatures']
	])('are not taken for differences: %s', (expression, words) => {
		expect(faultOf(expression, [T1, T2]).message).toContain(words);
	});

	it('carry the uncertainty of their degrees in kelvins', () => {
		const rise = calculation('rise', 'T - 10 degC');
		const { outcome } = quantityOf([given('T', '68', 'degF', '1.8'), rise], 'rise');
		// 1.8 °F = 1 K.
		expect(outcome).toMatchObject({ quantity: { unit: 'K', uncertainty: expect.closeTo(1, 12) } });
	});
});

describe('a fault in an expression', () => {
	it.each([
		['m_lift + σ', 'dimension'],
		['foo', 'unknown-symbol'],
		['g', 'unknown-symbol'],
		['2*h', 'unknown-symbol'],
		['foo(2)', 'unknown-function'],
		['FS(2)', 'unknown-function'],
		['sqrt', 'syntax'],
		['sin(1, 2)', 'syntax'],
		['1 +', 'syntax'],
		['(1 + 2', 'syntax'],
		['1 + 2)', 'syntax'],
		['1 2', 'syntax'],
		['* 3', 'syntax'],
		['1 < 2 ? 3', 'syntax'],
		['1,5', 'bad-number'],
		['1/2 km', 'ambiguous-name'],
		['3 km^x', 'syntax'],
		['5 % 3', 'syntax'],
		['x = 3', 'not-allowed'],
		['f(x) = 3', 'not-allowed'],
		['"text"', 'not-allowed'],
		['[1:2]', 'not-allowed'],
		['1; 2', 'not-allowed'],
		['5!', 'not-allowed'],
		["a'", 'not-allowed'],
		['1:3', 'not-allowed'],
		['a.constructor', 'unknown-symbol'],
		['constructor', 'unknown-symbol'],
		['__proto__', 'not-allowed'],
		['createUnit(2)', 'unknown-function'],
		['import(2)', 'unknown-function'],
		['σ to MPa', 'not-allowed'],
		['1/(FS - 2)', 'division-by-zero'],
		['0^(-1)', 'division-by-zero'],
		['sqrt(-1)', 'domain'],
		['ln(0)', 'domain'],
		['(-2)^0.5', 'domain'],
		['asin(2)', 'domain'],
		['exp(1e4)', 'beyond-any-build'],
		['1e200*1e200', 'beyond-any-build'],
		['1e999', 'beyond-any-build'],
		['sin(2 m)', 'dimension'],
		['2^(3 m)', 'dimension'],
		['m_lift^FS', 'dimension'],
		['1 < 2', 'dimension'],
		['1 ? 2 : 3', 'dimension'],
		['1 m < 2 s ? 1 : 2', 'dimension'],
		['x'.repeat(5000), 'too-long'],
		['('.repeat(101) + '1' + ')'.repeat(101), 'too-long'],
		['-'.repeat(3000) + '1', 'too-long'],
		[Array(150).fill('2').join('^'), 'too-long'],
		[Array(1500).fill('1').join('+'), 'too-long']
	])('%s is told as %s', (expression, code) => {
		const others = [given('FS', '2'), given('m_lift', '20', 't'), given('σ', '1', 'GPa')];
		const fault = faultOf(expression, others);
		expect(fault).toMatchObject({ code });
		expect(fault.message).not.toMatch(/\$\d|undefined|NaN|Infinity|Node/);
	});

	it('names both dimensions', () => {
		const others = [given('σ', '1', 'GPa')];
		expect(faultOf('σ + 2 t', others)).toMatchObject({
			message:
				'2\u202ft cannot be added: it is a mass, M; σ before it is a pressure or stress, M L⁻¹ T⁻².',
			span: { field: 'expression', from: 4, to: 7 }
		});
		expect(faultOf('2 t', [], 'GPa').message).toBe(
			'The value is a mass, M; it cannot be shown in GPa, which is a pressure or stress, M L⁻¹ T⁻².'
		);
	});

	it('says what a lone unit name would have meant, and what lies near a mistyped symbol', () => {
		expect(faultOf('2*g').remedy).toContain('directly after a number: 1 g');
		expect(faultOf('sigma_dd', [given('sigma_d', '1')]).near).toEqual(['sigma_d']);
		expect(faultOf('σ_', [given('σ_d', '1'), given('w', '2')]).near).toEqual(['σ_d']);
	});

	it('tells a name that is a unit and a quantity apart from neither', () => {
		const others = [given('h', '3', 'km')];
		expect(faultOf('5 h', others)).toMatchObject({
			code: 'ambiguous-name',
			span: { from: 2, to: 3 }
		});
		expect(evaluated('5 * h', others)).toBe('15 km');
		expect(faultOf('2 km/h', others).code).toBe('ambiguous-name');
	});

	it('tells every unknown symbol at once, each where it stands', () => {
		const fault = faultOf('aa1 + bb2');
		expect(fault.span).toEqual({ field: 'expression', from: 0, to: 3 });
	});
});

describe('the dimension of a power', () => {
	it('follows an exponent written out', () => {
		expect(evaluated('(2 m)^3', [], 'm^3')).toBe('8 m^3');
		expect(evaluated('(4 m^2)^(1/2)')).toBe('2 m');
		expect(evaluated('((8 m^3)^(1/3))^2', [], 'm^2')).toBe('4 m^2');
		expect(evaluated('(8 m^3)^(1/3) + 1 m')).toBe('3 m');
	});

	it('lets a pure number have any exponent', () => {
		expect(evaluated('FS^FS', [given('FS', '2')])).toBe('4');
	});

	it('is refused for an exponent that is no simple fraction', () => {
		expect(faultOf('(2 m)^pi').code).toBe('dimension');
		expect(faultOf('(2 m)^0.12345').code).toBe('dimension');
	});
});

describe('a bare zero', () => {
	it('has whatever dimension stands beside it', () => {
		expect(evaluated('max(0, 3 km)')).toBe('3 km');
		expect(evaluated('3 km > 0 ? 1 : 2')).toBe('1');
		expect(faultOf('max(0, 3 km, 2 s)').code).toBe('dimension');
	});
});
