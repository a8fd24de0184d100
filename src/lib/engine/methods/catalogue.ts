/** All methods, by the name under which they are called. */
import { asBuilt } from './as-built';
import type { AnyMethod } from './method';
import { uniformLine } from './uniform-line';

const ALL: readonly AnyMethod[] = [uniformLine, asBuilt];

export const METHODS: ReadonlyMap<string, AnyMethod> = new Map(
	ALL.map((method) => [method.name, method])
);
