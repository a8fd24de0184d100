/** A text cut where something stands in it: a fault's underline, somebody's caret. */
import type { Caret } from './carets';

export type Piece = { text: string; faulty: boolean; caretAfter: string };

export function pieces(
	text: string,
	spans: readonly { from: number; to: number }[],
	carets: readonly Caret[]
): Piece[] {
	const inside = (at: number) => Math.max(0, Math.min(text.length, at));
	const cuts = new Set([0, text.length]);
	for (const { from, to } of spans) cuts.add(inside(from)).add(inside(to));
	for (const { at } of carets) cuts.add(inside(at));
	const places = [...cuts].sort((a, b) => a - b);
	const names = (at: number) =>
		carets
			.filter((caret) => inside(caret.at) === at)
			.map(({ name }) => name)
			.join(', ');
	const start: Piece[] = names(0) ? [{ text: '', faulty: false, caretAfter: names(0) }] : [];
	return [
		...start,
		...places.slice(1).map((to, index) => {
			const from = places[index]!;
			return {
				text: text.slice(from, to),
				faulty: spans.some((span) => span.from <= from && to <= span.to),
				caretAfter: names(to)
			};
		})
	];
}
