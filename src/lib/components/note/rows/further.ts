/** Where a sized line is looked at further: the pages of methods, opened with this line filled in. */
import type { LineModelResult, Outcome } from '$lib/engine/calc/results';
import type { ItemOf } from '$lib/note/items';

export type Further = { title: string; href: string };

/** Texts as people type them, by the names of a method's inputs. */
type Filled = { [name: string]: string | boolean | Filled };

const RADII = 25;

/** None where the line could not be sized. */
export function furtherOf(item: ItemOf<'lineModel'>, result: LineModelResult): Further[] {
	const line = sizedLine(item, result);
	if (!line) return [];
	const { site, density, strength, section, counterweight, lift, balance, radii } = line;
	const built = { site, density, section, counterweight };
	const onMoon = site.kind === 'moon';
	const all: [title: string, method: string, input: Filled, onMoons: boolean][] = [
		['as built', 'as-built', { ...built, ...strength }, true],
		[
			'with a climber along it',
			'climber-envelope',
			{ ...built, ...strength, climbers: { kind: 'grid', mass: lift, count: '200' } },
			true
		],
		['periods', 'periods', built, true],
		['transit', 'transit', { site, mass: lift, from: line.base, to: balance }, true],
		['release', 'release', { site, radii }, false],
		['when severed', 'severed-line', { site, radii }, false]
	];
	return all
		.filter(([, , , onMoons]) => onMoons || !onMoon)
		.map(([title, method, input]) => ({
			title,
			href: `/methods/${method}#in=${encodeURIComponent(JSON.stringify(input))}`
		}));
}

function sizedLine(item: ItemOf<'lineModel'>, { inputs, outputs, profile }: LineModelResult) {
	const typed = (outcome: Outcome | undefined) => {
		if (outcome?.state !== 'value') return null;
		const { value, unit } = outcome.quantity;
		return `${value} ${unit}`.trim();
	};
	const input = (field: string) => typed(inputs.find((one) => one.field === field)?.outcome);
	const output = (name: string) => typed(outputs.find((one) => one.name === name)?.outcome);
	const [balance, designStress, baseArea] = ['r_s', 'design_stress', 'A0'].map(output);
	const [counterweight, lift, density] = [
		output('counterweight'),
		output('lift'),
		input('density')
	];
	const radius = outputs.find(({ name }) => name === 'r_s')?.outcome;
	if (!profile || !balance || !designStress || !baseArea || !counterweight || !lift || !density)
		return null;
	if (radius?.state !== 'value') return null;
	const base = radius.quantity.si - profile.synchronous;
	const top = base + profile.height.at(-1)!;
	const metres = (r: number) => `${r} m`;
	const radii = Array.from({ length: RADII }, (_, i) =>
		// Just above the surface, where what is let go still has a way to fall.
		metres(i === 0 ? base * (1 + 1e-6) : base + ((top - base) * i) / (RADII - 1))
	);
	return {
		site: siteOf(item, input),
		density,
		strength: {
			allowable: input('allowable') ?? '',
			factorOfSafety: input('factorOfSafety') ?? ''
		},
		section: { kind: 'taper', baseArea, designStress, top: metres(top) },
		counterweight,
		lift,
		balance,
		base: metres(base),
		radii: radii.join('\n')
	};
}

function siteOf(item: ItemOf<'lineModel'>, input: (field: string) => string | null): Filled {
	const given = (fields: Record<string, string>) =>
		Object.fromEntries(
			Object.entries(fields).flatMap(([name, field]) => {
				const value = input(field);
				return value === null ? [] : [[name, value]];
			})
		);
	switch (item.body) {
		case 'own':
			return {
				kind: 'own',
				...given({ gm: 'gm', radius: 'radius', period: 'period', j2: 'oblateness' })
			};
		case 'moonNear':
		case 'moonFar':
			return {
				kind: 'moon',
				side: item.body === 'moonNear' ? 'near' : 'far',
				...given({
					moonGm: 'gm',
					moonRadius: 'radius',
					primaryGm: 'primaryGm',
					distance: 'distance'
				})
			};
		default:
			return { kind: 'body', body: item.body, j2: item.j2 === 'with' };
	}
}
