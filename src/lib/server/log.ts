import { pino, type Logger } from 'pino';

let logger: Logger | null = null;

/** One JSON line per event; never a file's contents, a password or a token. */
export function log(): Logger {
	logger ??= pino({
		level: process.env.LOG_LEVEL ?? 'info',
		base: undefined,
		redact: ['password', '*.password', 'token', '*.token']
	});
	return logger;
}
