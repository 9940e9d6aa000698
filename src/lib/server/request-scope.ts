import { AsyncLocalStorage } from 'node:async_hooks';

/** What is known of a request before its caller is: for logs, audit entries and rate limits. */
export interface RequestScope {
	requestId: string;
	address: string;
	now: Date;
}

const scopes = new AsyncLocalStorage<RequestScope>();

/** Runs `work` so that everything it calls can ask for the request it belongs to. */
export function withRequestScope<Result>(scope: RequestScope, work: () => Result): Result {
	return scopes.run(scope, work);
}

export function requestScope(): RequestScope {
	return scopes.getStore() ?? { requestId: 'none', address: 'local', now: new Date() };
}
