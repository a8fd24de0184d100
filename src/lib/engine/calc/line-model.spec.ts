import { describe, expect, it } from 'vitest';
import { evaluated, given, lineModel, modelOf } from './items.fixture';

const output = (name: string, more = {}) => {
	const found = modelOf([lineModel(more)]).outputs.find((output) => output.name === name)!.outcome;
	return found.state === 'value' ? found.quantity : found;
};

describe('a line model', () => {
	it('gives quantities that other items use', () => {
		// Case D1, consistency figure computed with SciPy: 1 493 607.9 kg and 777 827.9 kg.
		expect(evaluated('line.mass + line.counterweight', [lineModel()], 'kg')).toMatch(/^2271435\.8/);
	});

	it('takes its inputs from the quantities of the note', () => {
		const items = [given('ρ', '1300', 'kg/m^3'), lineModel({ density: 'ρ' })];
		expect(modelOf(items)).toMatchObject({ uses: ['ρ'], waitsFor: [], faults: [] });
	});

	it('sizes from the section at the anchor as well', () => {
		const lift = output('lift', { baseMode: 'area', area: '3.905748 mm^2', lift: '' });
		expect(lift).toMatchObject({ unit: 't', value: expect.closeTo(20, 4) });
	});

	it('adds the reserve to the lift', () => {
		expect(output('A0', { reserve: '10 %' })).toMatchObject({
			value: expect.closeTo(3.905748 * 1.1, 5),
			unit: 'mm^2'
		});
	});

	it('is blank until every input is there', () => {
		expect(output('mass', { density: '' })).toEqual({ state: 'blank' });
	});

	it('draws the line over graded heights, synchronous height among them', () => {
		const { profile } = modelOf([lineModel()]);
		expect(profile!.height[0]).toBe(0);
		expect(profile!.height.at(-1)).toBe(1e8);
		expect(profile!.height).toContain(profile!.synchronous);
		expect(Math.max(...profile!.area)).toBeCloseTo(13.7555e-6, 9);
		expect(profile!.stress.every((stress) => stress === 50e9)).toBe(true);
	});

	it('refuses a top that is not above synchronous height', () => {
		const { faults, outputs, profile } = modelOf([lineModel({ top: '30 000 km' })]);
		expect(faults).toMatchObject([
			{
				field: '',
				fault: {
					code: 'refused',
					message:
						'The top is 30\u202f000 km up, not above synchronous height at 35\u202f786 km: nothing there pulls outwards to hold the line up.'
				}
			}
		]);
		expect(outputs[0]!.outcome).toEqual({ state: 'waits', for: [], rootIds: ['line'] });
		expect(profile).toBeNull();
	});

	it('refuses a top beyond what one body describes', () => {
		expect(modelOf([lineModel({ top: '1e15 km' })]).faults[0]!.fault.code).toBe('refused');
	});

	it.each([
		['density', '-3 kg/m^3', 'The density must be above 0.'],
		['density', '3 km', 'The density must be a density, M L⁻³; this is a length, L.'],
		['factorOfSafety', '0', 'The factor of safety must be above 0.'],
		['reserve', '-1', 'The reserve of lift must be 0 or more.'],
		['lift', 'foo', 'There is no quantity foo in this note.']
	])('tells what is wrong with its %s: %s', (field, text, message) => {
		expect(modelOf([lineModel({ [field]: text })]).faults).toMatchObject([
			{ field, fault: { message } }
		]);
	});

	it('tells a taper beyond any build by its exponent', () => {
		const taper = output('taper', { density: '7900 kg/m^3', allowable: '1 GPa' });
		expect(taper).toMatchObject({ state: 'fault', faults: [{ code: 'beyond-any-build' }] });
		expect((taper as { faults: { message: string }[] }).faults[0]!.message).toMatch(
			/taper ratio.*10 to the power 332\.\d/
		);
	});

	it('has no NaN however poor the material', () => {
		const model = modelOf([lineModel({ allowable: '1e-200 Pa' })]);
		expect(JSON.stringify(model.outputs)).not.toMatch(/null,"unit"|NaN|Infinity/);
	});

	it('warns that a Moon line is not described by the Moon alone', () => {
		const { warnings } = modelOf([lineModel({ body: 'moon', top: '200 000 km' })]);
		expect(warnings[0]).toContain('lies beyond its L1 at 58\u202f019 km');
	});

	it('warns that a climber above synchronous height is not covered', () => {
		expect(modelOf([lineModel()]).warnings.join(' ')).toContain('below the balance point only');
	});

	it('is no quantity itself', () => {
		expect(evaluated('line + 1', [lineModel()])).toMatchObject({
			message: 'line is a line model, not a quantity.'
		});
		expect(evaluated('line.tapper', [lineModel()])).toMatchObject({ near: ['line.taper'] });
	});
});
