/** What can complete a name being typed: symbols of the note first, then constants, functions, units. */
import { CONSTANTS } from '../quantities/constants';
import { inWords } from '../quantities/dimension';
import { OFFERED_UNITS, UNITS } from '../quantities/unit-table';
import { FUNCTIONS } from './functions';
import { canonical } from './names';
import type { Outcome } from './results';
import type { Sheet } from './sheet';

export type Suggestion =
	| { kind: 'symbol'; name: string; id: string; outcome: Outcome }
	| { kind: 'constant' | 'function' | 'unit'; name: string; description: string };

const MOST = 50;

const FIXED: Suggestion[] = [
	...[...CONSTANTS].map(([name, { description }]) => ({
		kind: 'constant' as const,
		name,
		description
	})),
	...Object.entries(FUNCTIONS).map(([name, { description }]) => ({
		kind: 'function' as const,
		name,
		description
	})),
	...OFFERED_UNITS.map((name) => ({
		kind: 'unit' as const,
		name,
		description: inWords(UNITS.get(name)!.dimension)
	}))
];

export function complete(sheet: Sheet, typed: string): Suggestion[] {
	const prefix = canonical(typed);
	const lower = prefix.toLowerCase();
	const begins = ({ name }: { name: string }) => name.toLowerCase().startsWith(lower);
	const symbols = [...sheet.symbols()]
		.filter(begins)
		.map((symbol): Suggestion => ({ kind: 'symbol', ...symbol }))
		.sort((a, b) => (a.name < b.name ? -1 : 1));
	// As typed before what differs in capitals: t the tonne before T.
	const exact = (list: Suggestion[]) => [
		...list.filter(({ name }) => name.startsWith(prefix)),
		...list.filter(({ name }) => !name.startsWith(prefix))
	];
	return [...exact(symbols), ...exact(FIXED.filter(begins))].slice(0, MOST);
}
