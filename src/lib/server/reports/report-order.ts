import { reasonText } from '../../messages/en/reasons';
import type { DocketView, FrozenDocket } from '../../schemas/docket';
import type { Disposition } from '../db/models/disposition';
import { LoggerRead } from '../db/models/logger-read';
import { Organisation } from '../db/models/organisation';
import { Site } from '../db/models/site';
import { StoredFile } from '../db/models/stored-file';
import { env } from '../env';
import { fileStore } from '../storage/store';
import { frozenDocketOf } from './frozen-docket';
import type { ReportAttachment, ReportInput } from './pdf/report-input';

/** What more than this would make a report too heavy to mail; the rest is named by hash and lies in the bundle. */
const embeddedBytesAtMost = 10_000_000;

/** Upload names are words of a stranger: only letters, digits, dot, dash and underscore go into the report. */
export function safeFileName(name: string): string {
	const safe = name
		.normalize('NFKD')
		.replace(/[^\w.-]+/g, '_')
		.replace(/^[._]+/, '')
		.slice(-80);
	return safe || 'export';
}

async function attachmentsOf(docket: FrozenDocket['docket']): Promise<ReportAttachment[]> {
	const store = await fileStore();
	const attachments: ReportAttachment[] = [];
	let total = 0;
	for (const logger of docket.loggers) {
		const read = logger.readId ? await LoggerRead.findByPk(logger.readId) : null;
		const file = read ? await StoredFile.findByPk(read.fileId) : null;
		if (!read || !file || total + file.bytes > embeddedBytesAtMost) continue;
		const name = `${logger.label}-${safeFileName(read.fileName)}`;
		if (attachments.some((known) => known.name === name)) continue;
		total += file.bytes;
		attachments.push({
			name,
			bytes: await store.read(file.sha256),
			mediaType: file.mediaType,
			description: `Export of logger ${logger.serial} as received, SHA-256 ${file.sha256}`
		});
	}
	return attachments;
}

function reasonTextsOf(docket: Pick<DocketView, 'lines' | 'site'>): Record<string, string[]> {
	const { zone, temperatureUnit } = docket.site;
	return Object.fromEntries(
		docket.lines.map((line) => [
			line.id,
			(line.recommendation?.reasons ?? []).map((reason) =>
				reasonText(reason, { zone, unit: temperatureUnit, referenceCelsius: line.referenceCelsius })
			)
		])
	);
}

/** Where anyone holding the report may ask whether it is genuine and current. */
export function checkAddress(frozenSha256: string): string {
	return `${env().origin}/verify/${frozenSha256.slice(0, 16)}`;
}

/** Everything the report of a signed version is drawn from: the frozen record and the bytes it names, nothing else. */
export async function reportOrder(disposition: Disposition): Promise<ReportInput> {
	const frozen = frozenDocketOf(disposition);
	const organisation = await Organisation.findOne({ rejectOnEmpty: true });
	const site = await Site.findByPk(frozen.docket.site.id, { rejectOnEmpty: true });
	return {
		frozen,
		signature: {
			signedBy: disposition.signedName,
			signedByTitle: disposition.signedTitle,
			meaning: disposition.meaning,
			signedAt: disposition.signedAt.toISOString(),
			zone: disposition.zone,
			version: disposition.version,
			reasons: disposition.reasons,
			frozenSha256: disposition.frozenSha256,
			amendmentReason: disposition.amendmentReason
		},
		reasonTexts: reasonTextsOf(frozen.docket),
		verifyAddress: checkAddress(disposition.frozenSha256),
		attachments: await attachmentsOf(frozen.docket),
		organisation: organisation.name,
		pageSize: site.pageSize,
		creationAt: disposition.signedAt.toISOString()
	};
}
