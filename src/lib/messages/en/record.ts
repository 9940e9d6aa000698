import { z } from 'zod';

const anyData = z.record(z.string(), z.unknown());

const outcomeWords: Record<string, string> = {
	accepted: 'accepted',
	conditions: 'accepted with conditions',
	part: 'accepted in part',
	rejected: 'rejected'
};

/** What each event says on a docket's record; the figures come from the entry's payload. */
const sentences: Record<string, (data: Record<string, unknown>) => string> = {
	'shipment.created': () => 'Docket opened',
	'shipment.changed': () => 'Papers changed',
	'shipment.cancelled': () => 'Load cancelled',
	'arrival.logged': () => 'Arrival logged',
	'pulp.recorded': ({ position }) => `Pulp reading, ${position}`,
	'photo.added': ({ kind }) => `Photo added, ${kind}`,
	'note.written': () => 'Note written',
	'note.file-attached': ({ fileSha256 }) =>
		`File attached to a note, SHA-256 ${String(fileSha256 ?? '').slice(0, 12)}`,
	'read.received': ({ fileName }) => `Export received, ${fileName}`,
	'read.answered': () => 'Question about a file answered',
	'read.kept': ({ readings }) => `Read kept, ${readings} readings`,
	'read.asked-qa': () => 'Question passed to QA',
	'read.asked-again': () => 'File asked about again',
	'read.kept-unread': () => 'File that cannot be read kept as evidence',
	'layout.applied': () => 'File read as last time, by a remembered answer',
	'read.withdrawn': () => 'Read withdrawn',
	'logger.assigned': ({ serial }) => `Logger ${serial} assigned`,
	'trim.made': () => 'Trim made',
	'trim.undone': () => 'Trim undone',
	'clock.corrected': () => 'Logger’s clock corrected',
	'clock.restored': () => 'Correction of a logger’s clock undone',
	'assessment.made': () => 'Life recomputed',
	'hold.put': () => 'Put on hold',
	'hold.lifted': () => 'Hold lifted',
	'docket.taken': ({ from }) => (from === null ? 'Review taken on' : `Review taken over from ${from}`),
	'docket.handed-back': () => 'Review handed back',
	'disposition.signed': ({ version, verdict }) =>
		`Version ${version} signed, ${outcomeWords[String(verdict)] ?? verdict}`,
	'disposition.refused': () => 'Signature refused',
	'disposition.reviewed': () => 'Decision reviewed and signed; another person approves',
	'determination.written': () => 'Determination written by a qualified person',
	'report.sealed': () => 'Receiving report sealed',
	'report.opened': () => 'Receiving report opened',
	'notice.queued': ({ number }) => `Notice ${number} written`,
	'notice.sent': () => 'Notice sent',
	'notice.failed': () => 'Notice could not be sent',
	'notice.opened': () => 'Notice opened by the supplier',
	'link.sent': () => 'Link sent',
	'link.used': () => 'Link used',
	'answer.given': ({ kind }) => (kind === 'dispute' ? 'Supplier disputes' : 'Supplier acknowledges'),
	'claim.opened': ({ number }) => `Claim ${number} opened`,
	'claim.changed': () => 'Claim changed',
	'evidence.taken': () => 'Evidence bundle taken',
	'copy.taken': () => 'Copy taken for an inspector',
	'retention.held': () => 'Kept beyond its period, by hand',
	'retention.released': () => 'No longer kept beyond its period',
	'retention.blanked': () => 'Personal contents taken out by retention',
	'retention.emptied': () => 'What rows said of people taken out by retention',
	'retention.deleted': ({ what }) => `Taken out by retention, ${what}`
};

/** One line for a record: what happened. A payload blanked by retention leaves the kind of event. */
export function recordText(type: string, payload: string | null): string {
	const data = payload === null ? {} : anyData.parse(JSON.parse(payload));
	return sentences[type]?.(data) ?? type.replace('.', ' ');
}
