import { systemContext, type Context } from '../context';
import type { RequestScope } from '../request-scope';

/** The context of somebody who is only just showing who they are: the audit trail names them, not the program. */
export function personContext(scope: RequestScope, kind: 'user' | 'link', id: string): Context {
	const { actor, now, requestId } = systemContext(scope.now, scope.requestId);
	return { actor: { ...actor, kind, id, roles: [] }, now, requestId, address: scope.address };
}
