/** The engine beside the page, so that typing is never held up. */
import { complete } from '$lib/engine/calc/completion';
import { createSheet } from '$lib/engine/calc/sheet';
import type { FromWorker, ToWorker } from './messages';

// The page's DOM types know only its own window; a worker's scope has these two.
const scope = self as unknown as {
	onmessage: (event: MessageEvent<ToWorker>) => void;
	postMessage: (message: FromWorker) => void;
};

const sheet = createSheet();

scope.onmessage = ({ data }) => {
	if (data.kind === 'apply') {
		scope.postMessage({ kind: 'results', ...sheet.apply(data.change) });
	} else {
		const suggestions = complete(sheet, data.prefix);
		scope.postMessage({ kind: 'suggestions', question: data.question, suggestions });
	}
};
