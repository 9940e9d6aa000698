import { QueryTypes, type Transaction } from 'sequelize';
import { isoDay } from '../../format-time';
import { NumberSeries } from '../db/models/number-series';
import { database } from '../db/sequelize';

/** What of a site a number is made of. */
export interface NumberedSite {
	id: string;
	code: string;
	zone: string;
}

/**
 * The next number of a site and its year, such as PS-26-0001. The series' row stays locked until the transaction ends,
 * so two dockets never share a number. One that was given is never given again, even when its docket is cancelled.
 */
export async function nextDocketNumber(
	site: NumberedSite,
	now: Date,
	transaction: Transaction
): Promise<string> {
	const year = Number(isoDay(now, site.zone).slice(0, 4));
	const key = { siteId: site.id, year, kind: 'docket' as const };
	await database().query(
		`INSERT IGNORE INTO number_series (site_id, year, kind, last) VALUES (:siteId, :year, :kind, 0)`,
		{ replacements: key, type: QueryTypes.INSERT, transaction }
	);
	const series = await NumberSeries.findOne({ where: key, transaction, lock: transaction.LOCK.UPDATE });
	if (!series) throw new Error('The number series could not be opened.');
	await series.increment('last', { transaction });
	const number = series.last + 1;
	return `${site.code}-${String(year % 100).padStart(2, '0')}-${String(number).padStart(4, '0')}`;
}
