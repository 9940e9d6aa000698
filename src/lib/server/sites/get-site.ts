import type { Context } from '../context';
import { Shipment } from '../db/models/shipment';
import { Site } from '../db/models/site';
import { SiteHoliday } from '../db/models/site-holiday';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { holidayView, siteRecordView, type HolidayView, type SiteRecordView } from './views';

export interface SiteRecord extends SiteRecordView {
	holidays: HolidayView[];
	/** Once a docket carries the prefix, it stays. */
	hasDockets: boolean;
}

/** One site with its holidays. @throws Refusal `not-found`, `not-allowed` */
export async function getSite(ctx: Context, siteId: string): Promise<SiteRecord> {
	authorize(ctx, 'catalogue.change');
	const site = await Site.findByPk(siteId);
	if (!site) throw new Refusal('not-found');
	const holidays = await SiteHoliday.findAll({ where: { siteId }, order: [['heldOn', 'asc']] });
	const hasDockets = (await Shipment.findOne({ where: { siteId }, attributes: ['id'] })) !== null;
	return { ...siteRecordView(site), holidays: holidays.map(holidayView), hasDockets };
}
