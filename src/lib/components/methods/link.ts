/** What was typed into a form as part of an address, so that another person opens the same computation. */
import type { Parameter, Parameters } from '$lib/engine/methods/parameter';
import { blankFields, blankOf, tableColumns, type Typed, type TypedFields } from './typed';

/** Addresses that mail programs and chats still pass on whole. */
const LONGEST = 8000;
const BEGINS = '#in=';

/** What differs from the blank form, as the hash of an address; null where that is too long. */
export function hashOf(fields: Parameters, typed: TypedFields): string | null {
	const blank = blankFields(fields);
	const changed = Object.entries(typed).filter(
		([name, value]) => JSON.stringify(value) !== JSON.stringify(blank[name])
	);
	const hash = BEGINS + encodeURIComponent(JSON.stringify(Object.fromEntries(changed)));
	return hash.length <= LONGEST ? hash : null;
}

/** The form as an address has it; null where it has none that can be read. */
export function typedFrom(fields: Parameters, hash: string): TypedFields | null {
	if (!hash.startsWith(BEGINS)) return null;
	try {
		const found: unknown = JSON.parse(decodeURIComponent(hash.slice(BEGINS.length)));
		return partsFrom(fields, found);
	} catch {
		return null;
	}
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
	typeof value === 'object' && value !== null && !Array.isArray(value);

function partsFrom(fields: Parameters, found: unknown): TypedFields {
	const parts = isRecord(found) ? found : {};
	return Object.fromEntries(
		Object.entries(fields).map(([name, parameter]) => [
			name,
			Object.hasOwn(parts, name) ? oneFrom(parameter, parts[name]) : blankOf(parameter)
		])
	);
}

/** An address may say anything: what does not have the form of the field leaves it blank. */
function oneFrom(parameter: Parameter, found: unknown): Typed {
	switch (parameter.kind) {
		case 'flag':
			return typeof found === 'boolean' ? found : blankOf(parameter);
		case 'choice':
			return typeof found === 'string' && (found === '' || Object.hasOwn(parameter.options, found))
				? found
				: blankOf(parameter);
		case 'list':
			if (tableColumns(parameter)) break;
			return Array.isArray(found)
				? found.slice(0, parameter.most).map((one) => oneFrom(parameter.of, one))
				: [];
		case 'group': {
			const isSaid = isRecord(found) && found[''] === true;
			return {
				...(parameter.optional && { '': isSaid }),
				...partsFrom(parameter.fields, found)
			};
		}
		case 'variant': {
			const kind = isRecord(found) ? String(found.kind) : '';
			if (!Object.hasOwn(parameter.cases, kind)) return blankOf(parameter);
			return { kind, ...partsFrom(parameter.cases[kind]!.fields, found) };
		}
	}
	return typeof found === 'string' ? found : blankOf(parameter);
}
