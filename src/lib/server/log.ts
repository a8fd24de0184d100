/** The process's log: one JSON object a line on standard output. */
import { pino } from 'pino';

/** An error as the log shows it. Values of a failed query are left out: sessions are among them. */
export function loggedError(error: unknown) {
	if (!(error instanceof Error)) return error;
	const shown: Record<string, unknown> = { ...pino.stdSerializers.err(error) };
	delete shown.params;
	const withoutValues = (text: unknown) =>
		String(text).replace(/\nparams: [^]*?(?=\n {4}at |\ncaused by: |$)/g, '');
	return { ...shown, message: withoutValues(shown.message), stack: withoutValues(shown.stack) };
}

export const log = pino({
	level: process.env.LOG_LEVEL ?? 'info',
	base: null,
	timestamp: pino.stdTimeFunctions.isoTime,
	serializers: { error: loggedError },
	// Attack stopped here: whoever reads the log signs in with what it shows.
	redact: ['*.password', '*.token', '*.cookie', '*.headers.cookie', '*.headers.authorization']
});
