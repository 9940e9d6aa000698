import { AsyncLocalStorage } from 'node:async_hooks';

/** An act that was declined to somebody, for the audit trail. */
export interface RefusedAct {
	act: string;
	why: string;
	/** The docket it was about, where it was about one. */
	shipmentId: string | null;
}

/** What is known of a request before its caller is: for logs, audit entries and rate limits. */
export interface RequestScope {
	requestId: string;
	address: string;
	now: Date;
	/** What was declined to it so far; written into the trail once it has been answered. */
	refusedActs?: RefusedAct[];
}

const scopes = new AsyncLocalStorage<RequestScope>();

/** Runs `work` so that everything it calls can ask for the request it belongs to. */
export function withRequestScope<Result>(scope: RequestScope, work: () => Result): Result {
	return scopes.run(scope, work);
}

export function requestScope(): RequestScope {
	return scopes.getStore() ?? { requestId: 'none', address: 'local', now: new Date() };
}

/** Takes note that an act was declined; outside a request there is nobody to note it for. */
export function noteRefusedAct(refused: RefusedAct): void {
	const scope = scopes.getStore();
	if (scope) (scope.refusedActs ??= []).push(refused);
}
