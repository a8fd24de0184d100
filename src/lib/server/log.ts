/** The process's log: one JSON object a line on standard output. */
import { pino } from 'pino';

export const log = pino({
	level: process.env.LOG_LEVEL ?? 'info',
	base: null,
	timestamp: pino.stdTimeFunctions.isoTime,
	serializers: { error: pino.stdSerializers.err },
	// Attack stopped here: whoever reads the log signs in with what it shows.
	redact: ['*.password', '*.token', '*.cookie', '*.headers.cookie', '*.headers.authorization']
});
