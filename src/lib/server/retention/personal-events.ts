import type { EventType } from '../audit/catalogue';

/** Events whose payload names or describes a person. What was done, when and by whose account stays in the entry. */
export const personalEvents: readonly EventType[] = [
	'account.invited',
	'account.changed',
	'session.refused',
	'contact.saved',
	'arrival.logged',
	'note.written',
	'notice.sent',
	'notice.failed',
	'answer.given'
];
