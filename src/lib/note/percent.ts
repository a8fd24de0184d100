import { formatFigure } from '../engine/quantities/format';

const THIN_SPACE = '\u202f';
const MINUS = '\u2212';

/** A relative change: "−5.6 %", "+0.003 %", "×12.4" from eleven times upwards; empty where there is none. */
export function percentWords(change: number | null): string {
	if (change === null || !Number.isFinite(change)) return '';
	if (change === 0) return `0${THIN_SPACE}%`;
	if (change >= 10) return `×${formatFigure(change + 1, 3)}`;
	const size = Math.abs(change) * 100;
	const figure = size >= 0.05 && size < 1000 ? size.toFixed(1) : formatFigure(size, 2);
	return `${change < 0 ? MINUS : '+'}${figure}${THIN_SPACE}%`;
}
