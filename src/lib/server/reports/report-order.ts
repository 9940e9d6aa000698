import { reasonText } from '../../messages/en/reasons';
import type { DocketView } from '../../schemas/docket';
import type { Disposition } from '../db/models/disposition';
import { Organisation } from '../db/models/organisation';
import { Site } from '../db/models/site';
import { env } from '../env';
import { frozenDocketOf } from './frozen-docket';
import { attachmentsOf } from './attachments';
import type { ReportInput } from './pdf/report-input';
import { photosOf } from './printed-photos';

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
		photos: await photosOf(frozen.docket),
		organisation: organisation.name,
		pageSize: site.pageSize,
		creationAt: disposition.signedAt.toISOString()
	};
}
