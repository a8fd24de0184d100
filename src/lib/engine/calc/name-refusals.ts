/** What is said of a name that stands for nothing, or for two things. */
import { CONSTANTS } from '../quantities/constants';
import { UNITS } from '../quantities/unit-table';
import { Refusal, type Place } from './faults';
import type { Scope } from './scope';
import { leaves, type Expr } from './tree';

export const ambiguousName = (name: string, place: Place) =>
	new Refusal('ambiguous-name', `“${name}” is a unit and also a quantity of this note.`, {
		remedy: 'Write “*” before it to mean the quantity, or give the quantity another symbol.',
		place
	});

function placeOfName(expr: Expr, name: string) {
	for (const leaf of leaves(expr)) {
		if (leaf.kind === 'name' && leaf.name === name) return leaf.place;
	}
	return null;
}

export function unknownName(name: string, expr: Expr, scope: Scope): Refusal {
	const near = scope.near(name);
	const place = placeOfName(expr, name);
	const [model] = name.split('.');
	if (name !== model && scope.supply(model!) === 'model') {
		return new Refusal('unknown-symbol', `${model} gives no “${name.slice(model!.length + 1)}”.`, {
			place,
			near
		});
	}
	if (name !== model && [...CONSTANTS.keys()].some((known) => known.startsWith(`${model}.`))) {
		return new Refusal('unknown-symbol', `There is no constant ${name}.`, { place, near });
	}
	if (name === 'to' || name === 'in') {
		return new Refusal('not-allowed', `“${name}” converts nothing here.`, {
			remedy: 'Choose the unit to show the value in beside the expression.',
			place
		});
	}
	const remedy = UNITS.has(name)
		? `If the unit is meant, write it directly after a number: 1 ${name}.`
		: '';
	return new Refusal('unknown-symbol', `There is no quantity ${name} in this note.`, {
		remedy,
		place,
		near
	});
}

export const modelName = (name: string, expr: Expr, scope: Scope) =>
	new Refusal('unknown-symbol', `${name} is a line model, not a quantity.`, {
		remedy: `Name one of the quantities that it gives, e.g. ${name}.taper.`,
		place: placeOfName(expr, name),
		near: scope.near(`${name}.`)
	});
