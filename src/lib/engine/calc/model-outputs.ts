/** What a line model gives, each a quantity that other items name as `symbol.name`. */
import { AREA, FORCE, LENGTH, MASS, PRESSURE, PURE, type Dimension } from '../quantities/dimension';
import type { TaperResult } from '../line/taper';
import type { Told } from '../methods/parameter';

export type OutputDefinition = {
	name: string;
	description: string;
	tex: string;
	dimension: Dimension;
	value: (result: TaperResult) => Told;
};

const output = (
	name: string,
	tex: string,
	description: string,
	dimension: Dimension,
	value: OutputDefinition['value']
): OutputDefinition => ({ name, tex, description, dimension, value });

export const OUTPUTS: readonly OutputDefinition[] = [
	output('design_stress', '\\sigma_\\mathrm{d}', 'design stress', PRESSURE, (r) => r.designStress),
	output('taper', '\\tau', 'taper ratio, anchor to balance point', PURE, (r) => r.taper),
	output('A0', 'A_0', 'section at the anchor', AREA, (r) => r.baseArea),
	output('As', 'A_\\mathrm{s}', 'section at the balance point', AREA, (r) => r.synchronousArea),
	output('At', 'A_\\mathrm{t}', 'section at the top', AREA, (r) => r.topArea),
	output(
		'T_max',
		'T_\\mathrm{s}',
		'greatest tension, at the balance point',
		FORCE,
		(r) => r.greatestTension
	),
	output('mass', 'm_\\mathrm{L}', 'mass of the line', MASS, (r) => r.mass),
	output('mass_below', 'm_\\mathrm{L,b}', 'line below the balance point', MASS, (r) => r.massBelow),
	output('mass_above', 'm_\\mathrm{L,a}', 'line above it', MASS, (r) => r.massAbove),
	output('counterweight', 'm_\\mathrm{cw}', 'counterweight', MASS, (r) => r.counterweight),
	output('total', 'm_\\mathrm{tot}', 'line and counterweight', MASS, (r) => r.total),
	output('lift', 'm_\\mathrm{lift}', 'lift that the anchor section carries', MASS, (r) => r.lift),
	output('length', 'L', 'length, anchor to top', LENGTH, (r) => r.length),
	output(
		'r_s',
		'r_\\mathrm{s}',
		'balance radius, from the centre',
		LENGTH,
		(r) => r.synchronousRadius
	),
	output(
		'peak_uniform',
		'\\sigma_\\mathrm{u}',
		'greatest stress of a line of uniform section, for comparison',
		PRESSURE,
		(r) => r.uniformPeak
	),
	output(
		'free_length',
		'H',
		'height at which a uniform line stands free, for comparison',
		LENGTH,
		(r) => r.freeStandingHeight
	)
];

export const OUTPUT_TEX: Readonly<Record<string, string>> = Object.fromEntries(
	OUTPUTS.map(({ name, tex }) => [name, tex])
);
