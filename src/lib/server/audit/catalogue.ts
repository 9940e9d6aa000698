import type { Outcome } from '../../domain/receiving/recommendation';

/** Everything that can happen to a record, with what is written down about it. A new shape is a new type. */
export interface EventData {
	'account.invited': { userId: string; email: string; roles: string[] };
	'account.changed': { userId: string; before: Record<string, unknown>; after: Record<string, unknown> };
	'account.switched-off': { userId: string };
	'account.switched-on': { userId: string };
	'account.password-set': { userId: string };
	'account.locked': { userId: string; failedPasswords: number };
	'account.unlocked': { userId: string };
	'account.token-made': { userId: string; tokenId: string; name?: string };
	'account.token-revoked': { userId: string; tokenId: string };
	'account.second-factor': { userId: string; act: 'begun' | 'set' | 'removed' | 'reset' };
	'session.opened': { by: 'password' | 'link'; userId: string };
	'session.refused': { email: string; why: string };
	'act.refused': { act: string; why: string; shipmentId: string | null; route: string; method: string };
	'link.sent': { kind: string; contactId: string | null; userId: string | null };
	'link.used': { kind: string; contactId: string | null; userId: string | null };
	'site.saved': { siteId: string; before: Record<string, unknown> | null; after: Record<string, unknown> };
	'partner.saved': {
		partnerId: string;
		before: Record<string, unknown> | null;
		after: Record<string, unknown>;
	};
	'contact.saved': {
		contactId: string;
		partnerId: string;
		before: Record<string, unknown> | null;
		after: Record<string, unknown>;
	};
	'product.saved': {
		productId: string;
		before: Record<string, unknown> | null;
		after: Record<string, unknown>;
	};
	'spec.drafted': { specVersionId: string; productId: string; number: number; figuresSha256: string };
	'spec.discarded': { specVersionId: string; productId: string; number: number; figuresSha256: string };
	'spec.signed': {
		specVersionId: string;
		productId: string;
		number: number;
		figuresSha256: string;
		reason: string;
	};
	'logger.saved': {
		loggerId: string;
		before: Record<string, unknown> | null;
		after: Record<string, unknown>;
	};
	'lane.saved': { laneId: string; before: Record<string, unknown> | null; after: Record<string, unknown> };
	'shipment.created': { number: string; by: 'hand' | 'import' | 'seed' };
	'shipment.changed': {
		before: Record<string, unknown>;
		after: Record<string, unknown>;
		reason: string | null;
	};
	'shipment.cancelled': { reason: string };
	'arrival.logged': {
		arrivedAt: string;
		sealFound: string | null;
		isSealIntact: boolean | null;
		setPointCelsius: number | null;
		returnAirCelsius: number | null;
		driverName: string | null;
	};
	'pulp.recorded': { lineId: string | null; position: string; degrees: number; unit: string };
	'photo.added': { photoId: string; fileSha256: string; kind: string };
	'note.written': { noteId: string; text: string };
	/** An entry of its own, so that the hash stays where retention blanks the note's words. */
	'note.file-attached': { noteId: string; fileSha256: string; fileBytes: number; mediaType: string };
	'read.received': { readId: string; fileName: string; fileSha256: string; fileBytes: number; state: string };
	'read.answered': { readId: string; answers: Record<string, unknown> };
	'read.kept': { readId: string; traceIds: string[]; readings: number };
	'read.asked-qa': { readId: string };
	'read.asked-again': { readId: string; layoutId: string | null; answers: Record<string, unknown> };
	'read.kept-unread': { readId: string; fileSha256: string; refusalCode: string | null };
	'layout.remembered': {
		layoutId: string;
		readId: string;
		partnerId: string | null;
		fingerprint: string;
		answers: Record<string, unknown>;
	};
	'layout.applied': { layoutId: string; readId: string };
	'layout.forgotten': { layoutId: string; reason: string };
	'read.withdrawn': { readId: string; reason: string };
	'logger.assigned': {
		traceId: string;
		serial: string;
		lineId: string | null;
		compartmentId?: string | null;
	};
	'trim.made': { traceId: string; fromAt: string; toAt: string; reason: string };
	'trim.undone': { trimId: string };
	'clock.corrected': { readId: string; shiftMs: number; reason: string };
	'clock.restored': { readId: string; correctionId: string };
	'assessment.made': {
		engineVersion: string;
		assessments: {
			lineId: string;
			traceId: string;
			inputsSha256: string;
			remainingHours: number;
			remainingLowHours: number;
		}[];
		recommended: Record<string, string>;
	};
	'hold.put': { reason: string; awaited?: string | null; untilAt?: string | null };
	'hold.lifted': { holdId: string };
	'docket.taken': { from: string | null };
	'docket.handed-back': Record<string, never>;
	'disposition.signed': {
		dispositionId: string;
		version: number;
		verdict: string;
		meaning: string;
		frozenSha256: string;
		/** One a group; `pallets`, `name` and `whereabouts` since lines are decided by groups. */
		outcomes: {
			lineId: string;
			outcome: Outcome;
			cases: number;
			pallets?: number;
			name?: string;
			whereabouts?: string | null;
		}[];
		amendmentReason: string | null;
	};
	'disposition.reviewed': { reviewId: string; evidenceSha256: string; decisionSha256: string };
	'determination.written': { determinationId: string; evidenceSha256: string; text: string };
	'disposition.refused': { why: string };
	'report.sealed': {
		reportId: string;
		fileSha256: string;
		bytes: number;
		/** Whether an authority stamped the signature, and why not. */
		timestamp: { state: 'off' | 'stamped' | 'failed'; authority?: string; at?: string; why?: string };
	};
	'report.opened': { reportId: string };
	'notice.queued': { noticeId: string; number: string; partnerId: string };
	'notice.sent': { noticeId: string; messageId: string; to: string };
	'notice.failed': { noticeId: string; error: string };
	'notice.opened': { noticeId: string };
	'answer.given': { noticeId: string; kind: string; by: string };
	'claim.opened': { claimId: string; number: string; amountMinor: number | null; currency: string };
	'claim.changed': { claimId: string; before: Record<string, unknown>; after: Record<string, unknown> };
	'evidence.taken': { claimId: string | null; shipmentId: string; files: number };
	'certificate.made': { certificateId: string; sha256: string };
	'certificate.replaced': { certificateId: string; sha256: string };
	'certificate.ending': { certificateId: string; validUntil: string; told: number };
	'settings.changed': { name: string; before?: unknown; after?: unknown };
	'retention.held': { reason: string };
	'retention.released': { holdId: string; reason: string };
	'retention.blanked': { entries: string; kinds: string[]; rule: string; periodMonths: number };
	'retention.emptied': { rows: Record<string, number>; rule: string; periodMonths: number };
	'retention.deleted': {
		what: string;
		fileSha256: string;
		bytes: number;
		rule: string;
		periodMonths: number;
	};
	'copy.taken': { shipmentId: string; files: number };
	'record.exported': { as: 'csv' | 'pdf'; entries: number; filter: Record<string, string> };
}

export type EventType = keyof EventData;

/** One fact on its way into a chain: a docket's, else a site's, an account's or the organisation's. */
export type AuditEvent = {
	[Type in EventType]: { type: Type; data: EventData[Type]; chain: ChainName };
}[EventType];

export interface ChainName {
	scope: 'shipment' | 'site' | 'account' | 'organisation';
	id: string;
}

/** Builds an event; the type picks the shape of its data. */
export function event<Type extends EventType>(
	type: Type,
	chain: ChainName,
	data: EventData[Type]
): AuditEvent {
	return { type, chain, data } as AuditEvent;
}
