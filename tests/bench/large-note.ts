/** A large note for measuring: 100 texts and 200 calculations, each standing on the first given. */
import { BLANK, type Item, type NoteContent } from '$lib/note/items';

const SECTIONS = 10;
const TEXTS = 100;
export const CALCULATIONS = 200;

export const FIRST_GIVEN = 'given-first';
export const LAST_CALCULATION = `calc-${CALCULATIONS}`;

const WORDS =
	'The section under tension carries what hangs below it and the margin is read where the least is found. Joints are counted with their own mass and the sheet says which table they follow.'.split(
		' '
	);

export function largeNote(): NoteContent {
	const items: Item[] = [
		{ ...BLANK.section, id: 'section-0', kind: 'section', title: 'Given' },
		{
			...BLANK.given,
			id: FIRST_GIVEN,
			kind: 'given',
			symbol: 'σ_0',
			description: 'Stress at the start of the chain',
			value: '50',
			unit: 'GPa',
			source: 'Bench'
		}
	];
	for (let section = 1; section <= SECTIONS; section++) {
		items.push({
			...BLANK.section,
			id: `section-${section}`,
			kind: 'section',
			title: `Part ${section}`
		});
		for (let k = 1; k <= TEXTS / SECTIONS; k++) {
			const n = (section - 1) * (TEXTS / SECTIONS) + k;
			items.push(text(n), calculation(2 * n - 1), calculation(2 * n));
		}
	}
	return { format: 'holdfast-note', version: 1, thinLimit: '0.10', items };
}

function text(n: number): Item {
	const words = Array.from({ length: 60 }, (_, k) => WORDS[(n * 7 + k) % WORDS.length]!).join(' ');
	return {
		id: `text-${n}`,
		kind: 'text',
		body: {
			type: 'doc',
			content: [
				{
					type: 'paragraph',
					content: [
						{ type: 'text', text: `${n}. ${words} The value here is ` },
						{ type: 'quantity', attrs: { item: `calc-${n}`, output: '' } },
						{ type: 'text', text: '.' }
					]
				}
			]
		}
	};
}

/** Each stands on the one before, so that the last is reached through all. */
function calculation(n: number): Item {
	const before = `σ_${n - 1}`;
	return {
		...BLANK.calculation,
		id: `calc-${n}`,
		kind: 'calculation',
		symbol: `σ_${n}`,
		description: `Stress after step ${n}`,
		expression:
			n % 2 === 0
				? `${before} * (1 + 0.001 sin(${n}/10)) + sqrt(σ_0 * 1 kPa)`
				: `max(${before}, 1 MPa) / (1 + exp(-8))`,
		unit: 'GPa',
		digits: '8'
	};
}
