/** How a study is told which inputs of a method are uncertain, and how. */
import type { Correlation } from '../studies/correlation';
import type { Distribution } from '../studies/distribution';
import type { UncertainGiven } from '../studies/draws';
import { momentsOf } from '../studies/moments';
import type { Reach } from '../studies/swings';
import { PURE } from '../quantities/dimension';
import { group, list, quantity, variant, type ValueOf } from './parameter';
import { refuseInput } from './refused';
import { inputName, inputsNamed, type Subject } from './study';
import type { InputPath } from './value-path';

const figure = (label: string, more: { symbol?: string; help?: string } = {}) =>
	quantity({ label, ...more, dimension: null, unit: '', optional: true });

const bounds = {
	least: figure('lower bound', {
		help: 'Nothing below it: the distribution is cut off there, not heaped up.'
	}),
	most: figure('upper bound')
};
const mean = figure('mean', { help: 'The value in the method’s input where left out.' });
const u = quantity({
	label: 'standard uncertainty',
	symbol: 'u',
	dimension: null,
	unit: '',
	range: { above: 0 }
});
const optionalU = {
	...u,
	optional: true as const,
	help: 'This about the mean, or the ends.'
};

const distribution = variant({
	label: 'distribution',
	cases: {
		normal: { label: 'normal', fields: { mean, u, ...bounds } },
		lognormal: {
			label: 'lognormal, by mean and standard deviation of the quantity itself',
			fields: { mean, u, ...bounds }
		},
		uniform: {
			label: 'uniform',
			fields: {
				low: figure('lower end'),
				high: figure('upper end'),
				mean,
				u: optionalU,
				...bounds
			}
		},
		triangular: {
			label: 'triangular',
			fields: {
				low: figure('lower end'),
				mode: figure('mode'),
				high: figure('upper end'),
				mean,
				u: optionalU,
				...bounds
			}
		}
	}
});

const uncertain = list({
	label: 'uncertain inputs',
	fewest: 1,
	most: 50,
	of: group({
		label: 'uncertain input',
		fields: { path: inputName('input'), distribution }
	})
});

const correlations = list({
	label: 'correlations between them; none where left out',
	fewest: 0,
	most: 1225,
	optional: true,
	of: group({
		label: 'correlation',
		fields: {
			first: inputName('one input'),
			second: inputName('the other'),
			r: quantity({
				label: 'correlation',
				symbol: 'r',
				dimension: PURE,
				unit: '',
				range: { least: -1, most: 1 },
				help: 'Between their normal scores (a Gaussian copula); for normal inputs the linear correlation.'
			})
		}
	})
});

export const uncertainInputs = { uncertain, correlations } as const;

type Entry = ValueOf<typeof uncertain>[number];

export type Uncertain = {
	inputs: InputPath[];
	givens: UncertainGiven[];
	/** Mean, standard deviation and bounds of each. */
	reaches: Reach[];
	correlations: Correlation[];
};

/** @throws Refused where a path is none or named twice, or a distribution cannot be. */
export function uncertainOf(
	subject: Subject,
	entries: readonly Entry[],
	pairs: ValueOf<typeof correlations> = []
): Uncertain {
	const paths = entries.map(({ path }) => path);
	paths.forEach((path, i) => {
		if (paths.indexOf(path) < i) refuseInput(`uncertain.${i}.path`, `${path} is named twice.`);
	});
	const inputs = inputsNamed(subject, paths, 'uncertain');
	const givens = inputs.map((input, i) => ({
		name: input.path,
		distribution: distributionOf(entries[i]!.distribution, input, `uncertain.${i}`)
	}));
	const place = (path: string, at: string) => {
		const i = paths.indexOf(path);
		return i >= 0 ? i : refuseInput(at, `${path} is not among the uncertain inputs.`);
	};
	return {
		inputs,
		givens,
		reaches: givens.map(({ name, distribution }) => {
			const { mean, u } = momentsOf(name, distribution);
			return { name, value: mean, u, ...endsOf(distribution) };
		}),
		correlations: pairs.map(({ first, second, r }, i) => ({
			first: place(first, `correlations.${i}.first`),
			second: place(second, `correlations.${i}.second`),
			r
		}))
	};
}

function distributionOf(
	entry: Entry['distribution'],
	{ path, value, whole }: InputPath,
	at: string
): Distribution {
	if (whole) refuseInput(at, `${path} is a whole number: it has no distribution.`);
	const { kind, least, most } = entry;
	const mean = () =>
		entry.mean ?? value ?? refuseInput(at, `${path} is left out of the input: give its mean.`);
	if (kind === 'normal' || kind === 'lognormal')
		return { kind, mean: mean(), u: entry.u, least, most };

	const { u, low, high } = entry;
	const mode = kind === 'triangular' ? entry.mode : undefined;
	if (u !== undefined && low === undefined && high === undefined && mode === undefined)
		return { ...about(kind, mean(), u), least, most };
	if (u === undefined && entry.mean === undefined && low !== undefined && high !== undefined) {
		if (kind === 'uniform') return { kind, low, high, least, most };
		if (mode !== undefined) return { kind, low, mode, high, least, most };
	}
	const ends = kind === 'uniform' ? 'low and high' : 'low, mode and high';
	refuseInput(at, `${path}: give ${ends}, or u about the mean, and only one of the two.`);
}

/** Symmetric about the mean, with standard deviation u. */
function about(kind: 'uniform' | 'triangular', mean: number, u: number): Distribution {
	const half = u * Math.sqrt(kind === 'uniform' ? 3 : 6);
	const ends = { low: mean - half, high: mean + half };
	return kind === 'uniform' ? { kind, ...ends } : { kind, mode: mean, ...ends };
}

/** Between which a given lies at all. */
function endsOf(distribution: Distribution): {
	least: number | undefined;
	most: number | undefined;
} {
	const { least, most } = distribution;
	if (distribution.kind === 'normal') return { least, most };
	if (distribution.kind === 'lognormal') return { least: Math.max(0, least ?? 0), most };
	const { low, high } = distribution;
	return { least: Math.max(low, least ?? low), most: Math.min(high, most ?? high) };
}
