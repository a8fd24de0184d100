/**
 * Why the sync server closes a socket. 44xx says that trying again cannot help, and the stock provider
 * does not; any other code is followed by another try.
 */
export const CLOSE = {
	/** RFC 6455: the server is going away and comes back. */
	RESTART: 1012,
	/** RFC 6455: a frame larger than the server takes. Sent by the WebSocket library. */
	TOO_LARGE: 1009,
	/** A message that cannot be read as one of `protocol.ts`. */
	UNREADABLE: 4400,
	/** The session has ended, or there was none. */
	SIGNED_OUT: 4401,
	/** No such note in a programme that the person is in, or no longer in. */
	NO_SUCH_NOTE: 4404,
	/** This person has more sockets open than one may have. */
	TOO_MANY: 4529,
	/** The note cannot be loaded or kept just now, e.g. the database does not answer. */
	UNAVAILABLE: 4503
} as const;

/** What a person is told when a socket was closed for good. */
export const CLOSE_WORDS: Partial<Record<number, string>> = {
	[CLOSE.TOO_LARGE]:
		'An edit is larger than the server takes at once. Take the last large paste back, then reload.',
	[CLOSE.UNREADABLE]: 'The server could not read what this page sent. Reload the page.',
	[CLOSE.SIGNED_OUT]: 'Your session has ended. Sign in again to go on.',
	[CLOSE.NO_SUCH_NOTE]: 'You are no longer in the programme of this note, or the note is gone.'
};

/** Whether trying again cannot help. */
export function isFinal(code: number): boolean {
	return code === CLOSE.TOO_LARGE || (code >= 4400 && code < 4500);
}
