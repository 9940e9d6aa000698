export const roles = ['dock', 'qa', 'claims', 'admin', 'supplier'] as const;
export type Role = (typeof roles)[number];

/** Who is asking. A supplier belongs to one partner; a link session sees one docket of that partner. */
export interface Actor {
	kind: 'user' | 'link';
	id: string;
	name: string;
	title: string;
	email: string;
	roles: readonly Role[];
	siteIds: readonly string[];
	partnerId: string | null;
	/** Set for a session opened by a mailed link: the one docket it sees. */
	shipmentId: string | null;
	temperatureUnit: 'celsius' | 'fahrenheit' | null;
	/** The session a person works in; without one (a job, a program) nothing is signed in series. */
	sessionId?: string | null;
}

/** How a caller came in: by password, by a mailed link, by an API token, or as the program itself. */
export const sessionKinds = ['password', 'link', 'token', 'program'] as const;
export type SessionKind = (typeof sessionKinds)[number];

/** What every use case is told about its caller. */
export interface Context {
	actor: Actor;
	/** The moment the request came in, UTC. */
	now: Date;
	requestId: string;
	address: string;
	/** Absent while somebody is only just showing who they are. */
	sessionKind?: SessionKind;
}

const systemActor: Actor = {
	kind: 'user',
	id: '00000000-0000-7000-8000-000000000000',
	name: 'Wharfinger',
	title: 'system',
	email: '',
	roles: ['admin'],
	siteIds: [],
	partnerId: null,
	shipmentId: null,
	temperatureUnit: null
};

/** The context of work nobody asked for in person: jobs, migrations, the seed. */
export function systemContext(now: Date, requestId = 'system'): Context {
	return { actor: systemActor, now, requestId, address: 'local', sessionKind: 'program' };
}

export function isSystem(actor: Actor): boolean {
	return actor.id === systemActor.id;
}
