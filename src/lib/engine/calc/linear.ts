/** How a figure follows from others to first order: a change of it is the sum of slope times change over its inputs. */
import type { Slot } from './slot';

export type Linear = { inputs: readonly Slot[]; slopes: ArrayLike<number> };

/** What a change of several figures does to one that follows from them with these slopes. */
export function joined(parts: readonly Linear[], slopes: readonly number[]): Linear {
	return {
		inputs: parts.flatMap(({ inputs }) => inputs),
		slopes: parts.flatMap((part, i) => Array.from(part.slopes, (slope) => slopes[i]! * slope))
	};
}
