import { Certificate } from '../db/models/certificate';
import { Report } from '../db/models/report';
import { StoredFile } from '../db/models/stored-file';
import { sha256Hex } from '../storage/sha256';
import { fileStore } from '../storage/store';
import { checkSeal, type SealFault } from './seal/check-seal';

/** A kept report and what is wrong with it, if anything. */
export interface KeptReport {
	readonly reportId: string;
	readonly fileName: string;
	readonly fault: SealFault | 'missing' | 'other-bytes' | null;
	readonly timestampAt: string | null;
}

/**
 * Reads every kept report again, one at a time: are these the bytes whose hash was written down, and does the seal on
 * them stand by a certificate that was ours? Retired certificates count: what they sealed stays sealed.
 */
export async function* checkKeptReports(): AsyncGenerator<KeptReport> {
	const certificates = await Certificate.findAll({ attributes: ['sha256'] });
	const known = new Set(certificates.map(({ sha256 }) => sha256));
	for (const report of await Report.findAll({ order: ['madeAt', 'id'] })) yield checkOne(report, known);
}

async function checkOne(report: Report, known: ReadonlySet<string>): Promise<KeptReport> {
	const named = { reportId: report.id, fileName: report.fileName, timestampAt: null };
	const file = await StoredFile.findByPk(report.fileId, { rejectOnEmpty: true });
	const bytes = await (await fileStore()).read(file.sha256).catch((error: NodeJS.ErrnoException) => {
		if (error.code === 'ENOENT' || error.name === 'NoSuchKey') return null;
		throw error;
	});
	if (bytes === null) return { ...named, fault: 'missing' };
	if (sha256Hex(bytes) !== file.sha256) return { ...named, fault: 'other-bytes' };
	const { fault, timestampAt } = checkSeal(bytes, known);
	return { ...named, fault, timestampAt };
}
