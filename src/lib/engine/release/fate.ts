/** What becomes of a mass let go at rest on a turning line. */
import type { DoubleDouble } from '../numerics/double-double';
import { c3At, plunge } from './orbit';
import type { TurningBody } from './turning-body';

export const FATES = {
	comesDown: 'comes down: its periapsis lies below the entry interface',
	staysBound: 'stays bound to the body, above the entry interface',
	escapes: 'escapes from the body'
} as const;

export type Fate = keyof typeof FATES;

/** @param entry radius of the entry interface below r_s, m */
export function fateFrom(body: TurningBody, r: number, entry: DoubleDouble): Fate {
	if (plunge(body, r, entry) > 0) return 'comesDown';
	return c3At(body, r)[0] >= 0 ? 'escapes' : 'staysBound';
}
