/**
 * A climber's way along a line: v(r) = min(v_max, ηP/(m|g(r)|)), power-limited near the anchor, braking above
 * the balance radius at the same power. Kinetic energy is left out: it is paid and regained at the ends.
 */
import type { Field } from '../line/field';
import { integrate } from '../numerics/quadrature';
import { root } from '../numerics/root';

export type Climber = {
	/** kg */
	mass: number;
	/** v_max, m/s */
	topSpeed: number;
	/** P, W */
	power: number;
	/** η of the drive, 0 to 1 */
	efficiency: number;
	/** η_rec: share of the braked energy that is recovered */
	recovery: number;
};

export type Transit = {
	/** s */
	time: number;
	/** Drawn against g, J. */
	energy: number;
	/** To be braked, J; of it recovered, J. */
	braked: number;
	recovered: number;
	/** m/s, and the radius where it is reached, m. */
	leastSpeed: number;
	leastSpeedRadius: number;
	/** Coriolis force 2mωv at the greatest speed, N; westwards going up. */
	greatestSideForce: number;
};

export function speedAt(field: Field, { mass, topSpeed, power, efficiency }: Climber, r: number) {
	const weight = mass * Math.abs(field.g(r));
	return weight * topSpeed <= efficiency * power ? topSpeed : (efficiency * power) / weight;
}

/** Where v has a kink between the two radii: |g| = ηP/(m v_max), and the balance radius. */
export function turnsOf(field: Field, climber: Climber, from: number, to: number): number[] {
	const [low, high] = from < to ? [from, to] : [to, from];
	const level = (climber.efficiency * climber.power) / (climber.mass * climber.topSpeed);
	const turns = [low];
	// |g| is monotonic on each side of the balance radius.
	for (const [a, b] of [
		[low, Math.min(high, field.balance)],
		[Math.max(low, field.balance), high]
	] as const) {
		if (!(b > a)) continue;
		const beyond = (r: number) => Math.abs(field.g(r)) - level;
		if (beyond(a) * beyond(b) < 0) turns.push(root(beyond, a, b));
		turns.push(b);
	}
	return turns;
}

/** One way, up or down, between two radii of a line in this field. */
export function transit(field: Field, climber: Climber, from: number, to: number): Transit {
	const turns = turnsOf(field, climber, from, to);
	const speed = (r: number) => speedAt(field, climber, r);
	const time = integrate((r) => 1 / speed(r), graded(turns), 1e-12).value;
	const upwards = to > from;
	const balance = Math.min(Math.max(field.balance, turns[0]!), turns.at(-1)!);
	// Against g below the balance radius going up, above it going down.
	const inner = climber.mass * field.rise(turns[0]!, balance);
	const outer = climber.mass * field.rise(turns.at(-1)!, balance);
	const [lifted, braked] = upwards ? [inner, outer] : [outer, inner];
	const slowest = turns.reduce((least, r) => (speed(r) < speed(least) ? r : least));
	return {
		time,
		energy: lifted / climber.efficiency,
		braked,
		recovered: braked * climber.recovery,
		leastSpeed: speed(slowest),
		leastSpeedRadius: slowest,
		greatestSideForce: 2 * climber.mass * field.omega * Math.max(...turns.map(speed))
	};
}

/** Panels of at most a doubling of the radius. */
function graded(turns: readonly number[]): number[] {
	const edges = [turns[0]!];
	for (const to of turns.slice(1)) {
		const from = edges.at(-1)!;
		const parts = Math.max(1, Math.ceil(Math.log2(to / from)));
		for (let i = 1; i < parts; i += 1) edges.push(from * (to / from) ** (i / parts));
		edges.push(to);
	}
	return edges;
}
