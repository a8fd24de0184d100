/** All methods, by the name under which they are called. */
import { asBuilt } from './as-built';
import type { AnyMethod } from './method';
import { climberEnvelope } from './climber-envelope';
import { field } from './field';
import { steppedLine } from './stepped-line';
import { taper } from './taper';
import { uniformLine } from './uniform-line';

const ALL: readonly AnyMethod[] = [
	field,
	uniformLine,
	taper,
	steppedLine,
	asBuilt,
	climberEnvelope
];

export const METHODS: ReadonlyMap<string, AnyMethod> = new Map(
	ALL.map((method) => [method.name, method])
);
