import type { ClockView, DocketView, SignatureView } from '../../schemas/docket';
import type { DocketRows } from './load-rows';

/** Every signed version, the current one last. */
export function signatureViews(rows: DocketRows): SignatureView[] {
	const newest = rows.dispositions.at(-1);
	return rows.dispositions.map((row) => {
		const report = rows.reports.find((candidate) => candidate.dispositionId === row.id);
		const file = rows.files.find((candidate) => candidate.id === report?.fileId);
		return {
			dispositionId: row.id,
			version: row.version,
			isCurrent: row.id === newest?.id,
			signedBy: row.signedName,
			signedByTitle: row.signedTitle,
			meaning: row.meaning,
			signedAt: row.signedAt.toISOString(),
			zone: row.zone,
			reasons: row.reasons,
			amendmentReason: row.amendmentReason,
			frozenSha256: row.frozenSha256,
			report:
				report && file
					? { id: report.id, fileName: report.fileName, bytes: file.bytes, sha256: file.sha256 }
					: null
		};
	});
}

export function noticeViews(rows: DocketRows): DocketView['notices'] {
	return rows.notices.map((row) => ({
		id: row.id,
		number: row.number,
		partner: rows.partners.find((partner) => partner.id === row.partnerId)?.name ?? '',
		state: row.state,
		sentAt: row.sentAt?.toISOString() ?? null
	}));
}

export function clockViews(rows: DocketRows): ClockView[] {
	return rows.clocks.map((row) => ({
		id: row.id,
		name: row.name,
		basis: row.basis,
		startsAt: row.startsAt.toISOString(),
		deadlineAt: row.deadlineAt.toISOString(),
		metAt: row.metAt?.toISOString() ?? null
	}));
}
