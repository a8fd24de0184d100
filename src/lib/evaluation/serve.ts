/**
 * The worker's side of the engine. Figures are answered at once; the standard uncertainties that follow
 * from them when no edit has come for a moment, so that they never stand before a keystroke.
 */
import { complete } from '$lib/engine/calc/completion';
import { createSheet } from '$lib/engine/calc/sheet';
import type { FromWorker, ToWorker } from './messages';

/** Shorter than people pause, longer than they take from key to key when they type fast. */
const QUIET_MILLISECONDS = 60;

export function serve(send: (message: FromWorker) => void): (message: ToWorker) => void {
	const sheet = createSheet();
	let quiet: ReturnType<typeof setTimeout> | undefined;

	function tellUncertainties() {
		const changed = sheet.uncertainties();
		if (changed.length > 0) send({ kind: 'uncertainties', changed });
	}

	return (message) => {
		if (message.kind === 'complete') {
			const suggestions = complete(sheet, message.prefix);
			send({ kind: 'suggestions', question: message.question, suggestions });
			return;
		}
		const { changed, removed } = sheet.apply(message.change);
		send({ kind: 'results', changed, removed });
		clearTimeout(quiet);
		quiet = setTimeout(tellUncertainties, QUIET_MILLISECONDS);
	};
}
