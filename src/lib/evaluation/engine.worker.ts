/** The engine beside the page, so that typing is never held up. */
import { serve } from './serve';
import type { FromWorker, ToWorker } from './messages';

// The page's DOM types know only its own window; a worker's scope has these two.
const scope = self as unknown as {
	onmessage: (event: MessageEvent<ToWorker>) => void;
	postMessage: (message: FromWorker) => void;
};

const receive = serve((message) => scope.postMessage(message));
scope.onmessage = ({ data }) => receive(data);
