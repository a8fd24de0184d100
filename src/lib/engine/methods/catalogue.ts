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
import { firstOrder } from './first-order';
import { margin } from './margin';
import { massBudget } from './mass-budget';
import { monteCarlo } from './monte-carlo';
import { steppedLine } from './stepped-line';
import { sweep } from './sweep';
import { taper } from './taper';
import { toleranceFactor } from './tolerance-factor';
import { transit } from './transit';
import { tornado } from './tornado';
import { uniformLine } from './uniform-line';

const PLAIN: readonly AnyMethod[] = [
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
	allowable,
	margin,
	massBudget
];

const byName = (methods: readonly AnyMethod[]) =>
	new Map(methods.map((method) => [method.name, method]));

/** Studies act on the other methods, and are given them, so that no study acts on a study. */
const STUDIES: readonly AnyMethod[] = [monteCarlo, firstOrder, tornado, sweep].map((study) =>
	study(byName(PLAIN))
);

export const METHODS: ReadonlyMap<string, AnyMethod> = byName([...PLAIN, ...STUDIES]);
