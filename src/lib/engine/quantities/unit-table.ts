/**
 * The units people may type. Factors to coherent SI are exact unless said otherwise: SI Brochure (9th
 * edition), NIST Special Publication 811 (2008), IAU 2012 resolution B2 for the astronomical unit,
 * ISO 1144 for tex.
 *
 * A table of our own and not mathjs's unit module: that one adds 50 kB gzipped and 130 ms to the
 * worker's start, rounds psi and kip, has the electronvolt of before 2019, and lacks t,
 * ksi, tex and strain.
 */
import {
	dimension,
	AREA,
	ENERGY,
	FORCE,
	LENGTH,
	MASS,
	POWER,
	PRESSURE,
	PURE,
	TEMPERATURE,
	TIME,
	over,
	type Dimension
} from './dimension';

export type UnitDefinition = {
	factor: number;
	dimension: Dimension;
	/** SI value of the zero of the scale; only temperatures in °C and °F have one. */
	offset?: number;
	prefixes?: readonly string[];
};

export const PREFIXES: Record<string, number> = {
	E: 1e18,
	P: 1e15,
	T: 1e12,
	G: 1e9,
	M: 1e6,
	k: 1e3,
	h: 1e2,
	da: 1e1,
	d: 1e-1,
	c: 1e-2,
	m: 1e-3,
	µ: 1e-6,
	μ: 1e-6,
	u: 1e-6,
	n: 1e-9,
	p: 1e-12,
	f: 1e-15
};

const ALL = Object.keys(PREFIXES);
const LARGE = ['k', 'M', 'G', 'T'];
const SMALL = ['m', 'µ', 'μ', 'u', 'n'];

const CURRENT = dimension(0, 0, 0, 0, 1);
const VOLTAGE = over(POWER, CURRENT);
const CHARGE = dimension(0, 0, 1, 0, 1);
const LINEAR_DENSITY = over(MASS, LENGTH);

const POUND = 0.45359237;
const INCH = 0.0254;
const POUND_FORCE = POUND * 9.80665;
const PSI = POUND_FORCE / (INCH * INCH);
const DAY = 86400;

const unit = (
	factor: number,
	dimension: Dimension,
	prefixes?: readonly string[]
): UnitDefinition => ({ factor, dimension, prefixes });

const TABLE: Record<string, UnitDefinition> = {
	// SI base and named derived units (SI Brochure, tables 2 and 4)
	m: unit(1, LENGTH, ALL),
	g: unit(1e-3, MASS, ALL),
	s: unit(1, TIME, ALL),
	A: unit(1, CURRENT, ALL),
	K: unit(1, TEMPERATURE, ALL),
	mol: unit(1, dimension(0, 0, 0, 0, 0, 1), ALL),
	cd: unit(1, dimension(0, 0, 0, 0, 0, 0, 1), ALL),
	rad: unit(1, PURE, SMALL),
	sr: unit(1, PURE),
	Hz: unit(1, over(PURE, TIME), ALL),
	N: unit(1, FORCE, ALL),
	Pa: unit(1, PRESSURE, ALL),
	J: unit(1, ENERGY, ALL),
	W: unit(1, POWER, ALL),
	C: unit(1, CHARGE, ALL),
	V: unit(1, VOLTAGE, ALL),
	F: unit(1, over(CHARGE, VOLTAGE), ALL),
	ohm: unit(1, over(VOLTAGE, CURRENT), ALL),
	Ω: unit(1, over(VOLTAGE, CURRENT), ALL),
	degC: { factor: 1, dimension: TEMPERATURE, offset: 273.15 },
	'°C': { factor: 1, dimension: TEMPERATURE, offset: 273.15 },
	// Non-SI units accepted for use with the SI (table 8)
	min: unit(60, TIME),
	h: unit(3600, TIME),
	d: unit(DAY, TIME),
	day: unit(DAY, TIME),
	au: unit(149_597_870_700, LENGTH),
	deg: unit(Math.PI / 180, PURE),
	'°': unit(Math.PI / 180, PURE),
	arcmin: unit(Math.PI / 10_800, PURE),
	arcsec: unit(Math.PI / 648_000, PURE),
	ha: unit(1e4, AREA),
	L: unit(1e-3, dimension(0, 3), ALL),
	l: unit(1e-3, dimension(0, 3), ALL),
	t: unit(1e3, MASS, LARGE),
	eV: unit(1.602176634e-19, ENERGY, ALL),
	// Fibres: ISO 1144 tex; denier is 1 g per 9 000 m
	tex: unit(1e-6, LINEAR_DENSITY, ALL),
	den: unit(1e-3 / 9000, LINEAR_DENSITY),
	strain: unit(1, PURE, SMALL),
	'%': unit(1e-2, PURE),
	ppm: unit(1e-6, PURE),
	// Longer times; the mean sidereal day is of 86 164.090 5 s (Explanatory Supplement), the year Julian
	week: unit(7 * DAY, TIME),
	yr: unit(365.25 * DAY, TIME),
	sidereal_day: unit(86_164.0905, TIME),
	// NIST SP 811, appendix B
	bar: unit(1e5, PRESSURE, ['m', 'k', 'M']),
	atm: unit(101_325, PRESSURE),
	Wh: unit(3600, ENERGY, LARGE),
	kgf: unit(9.80665, FORCE),
	in: unit(INCH, LENGTH),
	inch: unit(INCH, LENGTH),
	ft: unit(0.3048, LENGTH),
	yd: unit(0.9144, LENGTH),
	mi: unit(1609.344, LENGTH),
	nmi: unit(1852, LENGTH),
	lb: unit(POUND, MASS),
	lbf: unit(POUND_FORCE, FORCE),
	kip: unit(1000 * POUND_FORCE, FORCE),
	psi: unit(PSI, PRESSURE),
	ksi: unit(1e3 * PSI, PRESSURE),
	Msi: unit(1e6 * PSI, PRESSURE),
	degF: { factor: 5 / 9, dimension: TEMPERATURE, offset: 459.67 * (5 / 9) }
};

/** Every unit and every prefixed unit by the name people type. */
export const UNITS: ReadonlyMap<string, UnitDefinition> = new Map(
	Object.entries(TABLE).flatMap(([name, definition]) => [
		...(definition.prefixes ?? []).map((prefix): [string, UnitDefinition] => [
			prefix + name,
			{ factor: definition.factor * PREFIXES[prefix]!, dimension: definition.dimension }
		]),
		// After its prefixed kin, so that an exact name wins (min is the minute).
		[name, { ...definition }] as [string, UnitDefinition]
	])
);

/** Names to offer while typing, without the less usual prefixes. */
export const OFFERED_UNITS: readonly string[] = Object.entries(TABLE).flatMap(
	([name, definition]) => [
		name,
		...['k', 'M', 'G', 'm', 'c', 'd', 'µ']
			.filter((prefix) => definition.prefixes?.includes(prefix))
			.map((prefix) => prefix + name)
	]
);
