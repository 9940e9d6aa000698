import { QueryTypes, type Transaction } from 'sequelize';
import { DateTime } from 'luxon';
import { Site } from '../db/models/site';
import { database } from '../db/sequelize';

const letters = { docket: null, notice: 'N', claim: 'CL' } as const;

/**
 * The next number of a site's series for the year at the site: `PS-26-1184`, `N-PS-26-0212`, `CL-PS-26-0047`. The row stays
 * locked until the transaction ends, so no number is given twice; one that is rolled back is given again, never skipped.
 */
export async function nextNumber(
	siteId: string,
	kind: keyof typeof letters,
	now: Date,
	transaction: Transaction
): Promise<string> {
	const site = await Site.findByPk(siteId, { transaction, rejectOnEmpty: true });
	const year = DateTime.fromJSDate(now, { zone: site.zone }).year;
	await database().query(
		`INSERT INTO number_series (site_id, year, kind, last) VALUES (:siteId, :year, :kind, 1)
		 ON DUPLICATE KEY UPDATE last = last + 1`,
		{ replacements: { siteId, year, kind }, transaction }
	);
	const [row] = await database().query<{ last: number }>(
		'SELECT last FROM number_series WHERE site_id = :siteId AND year = :year AND kind = :kind',
		{ replacements: { siteId, year, kind }, transaction, type: QueryTypes.SELECT }
	);
	const prefix = letters[kind] ? `${letters[kind]}-${site.code}` : site.code;
	return `${prefix}-${String(year % 100).padStart(2, '0')}-${String(row?.last ?? 0).padStart(4, '0')}`;
}
