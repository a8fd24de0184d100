/** What starts in the browser before the page's own script has come. */
import { startAhead } from '$lib/evaluation/evaluation';

const LIVE_NOTE = /^\/programmes\/[^/]+\/notes\/[^/]+\/?$/;

// The engine takes as long to start as a note's page does: the two start together.
if (LIVE_NOTE.test(location.pathname)) startAhead();
