import { Op } from 'sequelize';
import { reportCode } from '../../schemas/report-code';
import { isWithinLimit } from '../accounts/rate-limit';
import { Disposition } from '../db/models/disposition';
import { Report } from '../db/models/report';
import { StoredFile } from '../db/models/stored-file';
import { Refusal } from '../refusals';
import type { RequestScope } from '../request-scope';

/** What anyone may learn of a report: nothing about the load. */
export type ReportStanding =
	| { standing: 'current' | 'superseded'; version: number; signedAt: string; pdfSha256: string | null }
	| { standing: 'unknown' };

/** Enough for a counter that checks a lorry's worth of papers; far too few to guess sixteen digits. */
const lookUps = { attempts: 60, windowMs: 15 * 60_000 };
const digestDigits = 64;

/** The whole digest of a sealed file names its disposition. */
async function byFile(digits: string): Promise<string | null> {
	if (digits.length !== digestDigits) return null;
	const file = await StoredFile.findOne({ where: { sha256: digits }, attributes: ['id'] });
	const report = file ? await Report.findOne({ where: { fileId: file.id } }) : null;
	return report?.dispositionId ?? null;
}

async function findSigned(digits: string): Promise<Disposition | null> {
	const attributes = { exclude: ['frozen'] };
	const named = await byFile(digits);
	if (named) return Disposition.findByPk(named, { attributes });
	const found = await Disposition.findAll({
		where: { frozenSha256: { [Op.like]: `${digits}%` } },
		attributes,
		limit: 2
	});
	// Two records of one beginning: the code names neither.
	return found.length === 1 ? (found[0] ?? null) : null;
}

/**
 * Looks a report up by the code on its foot (the first sixteen or more digits of its record's SHA-256) or by the
 * SHA-256 of the file itself. @throws Refusal `too-many-attempts`
 */
export async function checkReport(typed: string, scope: RequestScope): Promise<ReportStanding> {
	if (!(await isWithinLimit(`report check from ${scope.address}`, lookUps, scope.now)))
		throw new Refusal('too-many-attempts');
	const digits = reportCode(typed);
	const disposition = digits ? await findSigned(digits) : null;
	if (!disposition) return { standing: 'unknown' };
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
