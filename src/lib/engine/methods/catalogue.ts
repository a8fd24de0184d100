/** All methods, by the name under which they are called. */
import { allowable } from './allowable';
import { asBuilt } from './as-built';
import { batchTest } from './batch-test';
import { climberEnvelope } from './climber-envelope';
import { couponStatistics } from './coupon-statistics';
import { cutRate } from './cut-rate';
import { field } from './field';
import { reach } from './reach';
import { release } from './release';
import { releaseCalendar } from './release-calendar';
import { severedLine } from './severed-line';
import { spinningAsBuilt } from './spinning-as-built';
import { spinningTether } from './spinning-tether';
import type { AnyMethod } from './method';
import { periods } from './periods';
import { sideDisplacement } from './side-displacement';
import { steppedLine } from './stepped-line';
import { taper } from './taper';
import { toleranceFactor } from './tolerance-factor';
import { transit } from './transit';
import { uniformLine } from './uniform-line';

const ALL: readonly AnyMethod[] = [
	field,
	uniformLine,
	taper,
	steppedLine,
	asBuilt,
	climberEnvelope,
	release,
	reach,
	releaseCalendar,
	severedLine,
	cutRate,
	spinningTether,
	spinningAsBuilt,
	transit,
	sideDisplacement,
	periods,
	couponStatistics,
	batchTest,
	toleranceFactor,
	allowable
];

export const METHODS: ReadonlyMap<string, AnyMethod> = new Map(
	ALL.map((method) => [method.name, method])
);
