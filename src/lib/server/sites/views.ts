import type { Site } from '../db/models/site';
import type { SiteHoliday } from '../db/models/site-holiday';
import { storedDocks, storedOpening } from '../../schemas/site';
import { revisionOf } from '../catalogue/revision';

/** What the form changes, and what the audit trail keeps of a change. */
export function siteFields(site: Site) {
	const { code, name, address, gln, zone, temperatureUnit, pageSize, currency } = site;
	return {
		code,
		name,
		address,
		gln,
		zone,
		temperatureUnit,
		pageSize,
		currency,
		opening: storedOpening.parse(site.opening),
		docks: storedDocks.parse(site.docks)
	};
}

export interface HolidayView {
	id: string;
	heldOn: string;
	name: string;
}

export function holidayView({ id, heldOn, name }: SiteHoliday): HolidayView {
	return { id, heldOn, name };
}

export interface SiteRecordView extends ReturnType<typeof siteFields> {
	id: string;
	switchedOffAt: string | null;
	revision: string;
}

export function siteRecordView(site: Site): SiteRecordView {
	const fields = siteFields(site);
	return {
		id: site.id,
		...fields,
		switchedOffAt: site.switchedOffAt?.toISOString() ?? null,
		revision: revisionOf(fields)
	};
}
