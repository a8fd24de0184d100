/** Cut rate: how often passing objects sever the line, and the chance of it within a time. */
import { cutProbability, cutRates } from '../release/cut-rate';
import { LENGTH, PURE, TIME, dimension, over } from '../quantities/dimension';
import { kilometres } from '../quantities/format';
import { defineMethod } from './method';
import { group, list, quantity } from './parameter';
import { refuseInput } from './refused';

const FLUX = dimension(0, -2, -1);
const RATE = over(PURE, TIME);

const height = (label: string) =>
	quantity({ label, dimension: LENGTH, unit: 'km', range: { least: 0 } });

export const cutRate = defineMethod({
	name: 'cut-rate',
	title: 'Cut rate',
	summary:
		'How often objects above the critical size sever the line, summed over height bands of the user’s own table, and the probability of a cut within a time.',
	subject: 'release',
	inputs: {
		bands: list({
			label: 'height bands, upwards',
			fewest: 1,
			most: 20_000,
			help: 'From an orbital debris and meteoroid model of the user’s own choice.',
			of: group({
				label: 'band',
				fields: {
					from: height('lower edge, above the surface'),
					to: height('upper edge, above the surface'),
					flux: quantity({
						label: 'flux of objects above the critical size',
						symbol: 'F',
						dimension: FLUX,
						unit: '1/(m^2 yr)',
						range: { least: 0 },
						help: 'The critical size is the least that severs the line there.'
					}),
					width: quantity({
						label: 'width in which a passing object severs the line',
						symbol: 'w',
						dimension: LENGTH,
						unit: 'm',
						range: { least: 0 },
						help: 'That of the line, and what of an object’s own size counts.'
					})
				}
			})
		}),
		time: quantity({
			label: 'time looked at',
			symbol: 't',
			dimension: TIME,
			unit: 'yr',
			range: { least: 0 }
		})
	},
	outputs: {
		rate: quantity({
			label: 'cut rate, Σ F w Δr',
			symbol: 'Λ',
			dimension: RATE,
			unit: '1/yr'
		}),
		probability: quantity({
			label: 'probability of a cut within the time, 1 − exp(−Λt)',
			symbol: 'P',
			dimension: PURE,
			unit: '%'
		}),
		meanTime: quantity({
			label: 'mean time to a cut, 1/Λ',
			dimension: TIME,
			unit: 'yr',
			optional: true,
			help: 'None where nothing cuts.'
		}),
		bandRates: list({
			label: 'cut rate of each band',
			fewest: 1,
			most: 20_000,
			of: quantity({ label: 'cut rate', dimension: RATE, unit: '1/yr' })
		})
	},
	sources: ['Poisson process: Λ = Σ F w Δr, P = 1 − exp(−Λt)'],
	validity:
		'Cuts are independent of each other and equally likely at all times; flux and width are constant within a band and over the time.',
	leftOut: [
		'objects that are tracked and avoided, and the line’s motion',
		'damage below severing, and redundancy of strands',
		'heights in no band, which count as free of objects'
	],
	refuses: ['bands that overlap, do not ascend or have no height'],
	caution:
		'As good as the table it is given. What a severed line does is for range safety rules and licensed practice to judge.',
	run({ bands, time }) {
		bands.forEach(({ from, to }, i) => {
			if (!(to > from))
				refuseInput(`bands.${i}.to`, `Band ${i + 1} does not end above where it begins.`);
			const below = bands[i - 1];
			if (below && from < below.to)
				refuseInput(
					`bands.${i}.from`,
					`Band ${i + 1} begins below the end of the one before it.`,
					'Order the bands upwards, so that none overlaps another.'
				);
		});
		const bandRates = cutRates(bands);
		const rate = bandRates.reduce((sum, part) => sum + part, 0);
		const meanTime = 1 / rate;
		return {
			outputs: {
				rate,
				probability: cutProbability(rate, time),
				meanTime: Number.isFinite(meanTime) ? meanTime : undefined,
				bandRates
			},
			warnings: bands.flatMap(({ from }, i) => {
				const end = bands[i - 1]?.to ?? from;
				if (from === end) return [];
				return [`No band covers the heights from ${kilometres(end)} to ${kilometres(from)}.`];
			})
		};
	}
});
