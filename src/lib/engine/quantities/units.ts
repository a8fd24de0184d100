/** A unit in a field of its own, and values to and from it. */
import { OFFERED_UNITS } from './unit-table';
import { NO_UNIT, scanUnit, type Unit } from './unit-reader';

export type { Unit };

export type ParsedUnit = { ok: true; unit: Unit } | { ok: false; message: string; remedy: string };

const known = new Map<string, ParsedUnit>();

/** The unit in a field of its own; empty is the pure number. */
export function parseUnit(text: string): ParsedUnit {
	const kept = known.get(text);
	if (kept) return kept;
	const parsed = readUnit(text.trim());
	if (known.size > 2000) known.clear();
	known.set(text, parsed);
	return parsed;
}

function readUnit(typed: string): ParsedUnit {
	if (typed === '' || typed === '1') return { ok: true, unit: NO_UNIT };
	const scanned = scanUnit(typed, 0, { tight: false });
	if (scanned && scanned.to === typed.length) {
		return { ok: true, unit: { ...scanned.unit, text: typed } };
	}
	const rest = typed.slice(scanned?.to ?? 0);
	if (scanned && /^[\s·⋅*×]+[\p{L}°]/u.test(rest) && typed.slice(0, scanned.to).includes('/')) {
		const [numerator, ...divisors] = typed.split('/');
		return {
			ok: false,
			message: `“${typed}” can be read in two ways: a product follows a division.`,
			remedy: `Write ${numerator!.trim()}/(${divisors.join('/').trim()}) if all of it divides.`
		};
	}
	const piece = /[\p{L}°][\p{L}\p{N}_]*|%/u.exec(rest)?.[0] ?? rest.trim();
	const near = nearUnits(piece);
	return {
		ok: false,
		message: `“${piece}” is not a unit known here.`,
		remedy: near.length > 0 ? `Near it: ${near.join(', ')}.` : ''
	};
}

/** Units that differ only in capitals: "mpa" is near MPa and mPa. */
export function nearUnits(name: string): string[] {
	const lower = name.toLowerCase();
	return OFFERED_UNITS.filter((unit) => unit !== name && unit.toLowerCase() === lower).slice(0, 3);
}

export const toSi = (value: number, unit: Unit) =>
	unit.offset === 0 ? value * unit.factor : value * unit.factor + unit.offset;

export const fromSi = (si: number, unit: Unit) =>
	unit.offset === 0 ? si / unit.factor : (si - unit.offset) / unit.factor;
