import { Op } from 'sequelize';
import { Disposition } from '../db/models/disposition';
import { Report } from '../db/models/report';
import { StoredFile } from '../db/models/stored-file';

/** What anyone may learn of a report: nothing about the load. */
export type ReportStanding =
	| { standing: 'current' | 'superseded'; version: number; signedAt: string; pdfSha256: string | null }
	| { standing: 'unknown' };

const codePattern = /^[0-9a-f]{16,64}$/;

/** Looks a report's code up: the first sixteen or more digits of its record's SHA-256. */
export async function checkReport(code: string): Promise<ReportStanding> {
	const digits = code.toLowerCase().replace(/[\s-]/g, '');
	if (!codePattern.test(digits)) return { standing: 'unknown' };
	const found = await Disposition.findAll({
		where: { frozenSha256: { [Op.like]: `${digits}%` } },
		attributes: { exclude: ['frozen'] },
		limit: 2
	});
	const disposition = found[0];
	if (!disposition || found.length > 1) return { standing: 'unknown' };
	const newer = await Disposition.count({
		where: { shipmentId: disposition.shipmentId, version: { [Op.gt]: disposition.version } }
	});
	const report = await Report.findOne({ where: { dispositionId: disposition.id } });
	const file = report ? await StoredFile.findByPk(report.fileId) : null;
	return {
		standing: newer > 0 ? 'superseded' : 'current',
		version: disposition.version,
		signedAt: disposition.signedAt.toISOString(),
		pdfSha256: file?.sha256 ?? null
	};
}
