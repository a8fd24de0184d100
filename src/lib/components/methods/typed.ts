/**
 * A method's inputs as people type them into its form, and the way from there to SI. Quantities are typed
 * in the unit that the method names, or with one of their own, and converted once.
 */
import type {
	ListParameter,
	NumberParameter,
	Parameter,
	Parameters
} from '$lib/engine/methods/parameter';
import { fits } from '$lib/engine/methods/check';
import type { InputFault } from '$lib/engine/methods/refused';
import { parseNumber } from '$lib/engine/quantities/number';
import { fromSi, parseUnit } from '$lib/engine/quantities/units';
import { readQuantity, type ReadQuantity } from './quantity';
import { rangeWords } from './shown';

/** What stands in one field: a text, a mark, named parts, or rows. */
export type Typed = string | boolean | TypedFields | Typed[];
export type TypedFields = { [name: string]: Typed };

/** A list whose rows are short lines of figures and words: typed as a table in one field. */
export function tableColumns(list: ListParameter): [string, Parameter][] | null {
	const { of } = list;
	const columns: [string, Parameter][] =
		of.kind === 'group' ? Object.entries(of.fields) : [['', of]];
	const plain = columns.every(([, { kind }]) =>
		['number', 'integer', 'text', 'choice'].includes(kind)
	);
	return plain ? columns : null;
}

const inUnit = (si: number, { unit }: NumberParameter) => {
	const parsed = parseUnit(unit);
	return parsed.ok ? Number(fromSi(si, parsed.unit).toPrecision(12)) : si;
};

/** What a form shows before anybody has typed. */
export function blankOf(parameter: Parameter): Typed {
	switch (parameter.kind) {
		case 'number':
			return parameter.default === undefined ? '' : String(inUnit(parameter.default, parameter));
		case 'integer':
			return parameter.default === undefined ? '' : String(parameter.default);
		case 'flag':
			return parameter.default;
		case 'choice':
			return (
				parameter.default ?? (parameter.optional ? '' : (Object.keys(parameter.options)[0] ?? ''))
			);
		case 'list':
			return tableColumns(parameter) ? '' : [];
		case 'group':
			return { ...(parameter.optional && { '': false }), ...blankFields(parameter.fields) };
		case 'variant': {
			const [kind, { fields }] = Object.entries(parameter.cases)[0]!;
			return { kind, ...blankFields(fields) };
		}
		default:
			return '';
	}
}

export const blankFields = (fields: Parameters): TypedFields =>
	Object.fromEntries(Object.entries(fields).map(([name, parameter]) => [name, blankOf(parameter)]));

/** What was typed, in SI; what cannot be read is left out and told with its place. */
export function readFields(
	fields: Parameters,
	typed: TypedFields,
	faults: InputFault[],
	path = ''
): Record<string, unknown> {
	const found: Record<string, unknown> = {};
	for (const [name, parameter] of Object.entries(fields)) {
		const at = path === '' ? name : `${path}.${name}`;
		const value = readOne(parameter, typed[name] ?? '', faults, at);
		if (value !== undefined) found[name] = value;
	}
	return found;
}

function readOne(parameter: Parameter, typed: Typed, faults: InputFault[], path: string): unknown {
	switch (parameter.kind) {
		case 'number':
		case 'integer':
			return readNumber(parameter, String(typed), faults, path);
		case 'flag':
			return typed === true;
		case 'choice':
		case 'text':
			return typed === '' ? undefined : typed;
		case 'list':
			return Array.isArray(typed)
				? typed.map((row, i) => readOne(parameter.of, row, faults, `${path}.${i}`))
				: readTable(parameter, String(typed), faults, path);
		case 'group': {
			const parts = typed as TypedFields;
			if (parameter.optional && parts[''] !== true) return undefined;
			return readFields(parameter.fields, parts, faults, path);
		}
		case 'variant': {
			const parts = typed as TypedFields;
			const kind = String(parts.kind);
			return { kind, ...readFields(parameter.cases[kind]!.fields, parts, faults, path) };
		}
		case 'open':
			return readOpen(String(typed), faults, path);
		case 'told':
			return undefined;
	}
}

/** What another method's description tells of, as JSON in SI. */
function readOpen(typed: string, faults: InputFault[], path: string): unknown {
	if (typed.trim() === '') return undefined;
	try {
		return JSON.parse(typed);
	} catch {
		faults.push({ path, message: 'This is not JSON.' });
		return undefined;
	}
}

function readNumber(
	parameter: Extract<Parameter, { kind: 'number' | 'integer' }>,
	typed: string,
	faults: InputFault[],
	path: string
): number | undefined {
	if (typed.trim() === '') return undefined;
	const number = parameter.kind === 'number' ? readQuantity(typed, parameter) : readFigure(typed);
	if (!number.ok) {
		faults.push({ path, message: number.message });
		return undefined;
	}
	if (!fits(parameter.range, number.si))
		faults.push({ path, message: `Must be ${rangeWords(parameter).join(' and ')}.` });
	return number.si;
}

function readFigure(typed: string): ReadQuantity {
	const number = parseNumber(typed);
	return number.ok
		? { ok: true, si: number.value }
		: { ok: false, message: `${number.message} ${number.remedy}`.trim() };
}

/** Rows of figures parted by tabs or semicolons; a comma may be meant as a decimal sign. */
function readTable(
	list: ListParameter,
	typed: string,
	faults: InputFault[],
	path: string
): unknown[] | undefined {
	const columns = tableColumns(list)!;
	const lines = typed.split('\n').filter((line) => line.trim() !== '');
	if (lines.length === 0 && (list.optional || list.fewest > 0)) return undefined;
	return lines.map((line, i) => {
		const cells = line.split(/[\t;]/).map((cell) => cell.trim());
		const at = `${path}.${i}`;
		if (cells.length > columns.length)
			faults.push({
				path: at,
				message: `Line ${i + 1} has ${cells.length} values, not ${columns.length}.`
			});
		const values = columns.map(([name, column], c): [string, unknown] => [
			name,
			readOne(column, cells[c] ?? '', faults, name === '' ? at : `${at}.${name}`)
		]);
		const [[first, value]] = values as [[string, unknown]];
		return first === '' ? value : Object.fromEntries(values.filter(([, v]) => v !== undefined));
	});
}
