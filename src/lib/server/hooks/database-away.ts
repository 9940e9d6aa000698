const names = new Set([
	'SequelizeConnectionError',
	'SequelizeConnectionRefusedError',
	'SequelizeConnectionAcquireTimeoutError',
	'SequelizeHostNotFoundError',
	'SequelizeHostNotReachableError',
	'SequelizeConnectionTimedOutError'
]);

/** Whether an error says that the database cannot be reached, rather than that we asked it something wrong. */
export function isDatabaseAway(error: unknown): boolean {
	if (!(error instanceof Error)) return false;
	if (names.has(error.name)) return true;
	return error.cause !== undefined && isDatabaseAway(error.cause);
}
