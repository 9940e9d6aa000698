import { fixedOffsetOf, offsetAtOf, offsetText } from '../times/zone';

const hour = 60;

/** Places whose winter offset is the one said and whose clocks change. Source: IANA time zone database, 2024. */
const changing: Readonly<Record<number, string>> = {
	[-9 * hour]: 'America/Anchorage',
	[-8 * hour]: 'America/Los_Angeles',
	[-7 * hour]: 'America/Denver',
	[-6 * hour]: 'America/Chicago',
	[-5 * hour]: 'America/New_York',
	[-4 * hour]: 'America/Halifax',
	[-3.5 * hour]: 'America/St_Johns',
	[-1 * hour]: 'Atlantic/Azores',
	0: 'Europe/London',
	[1 * hour]: 'Europe/Berlin',
	[2 * hour]: 'Europe/Helsinki',
	[9.5 * hour]: 'Australia/Adelaide',
	[10 * hour]: 'Australia/Sydney',
	[12 * hour]: 'Pacific/Auckland'
};

const seasons = [Date.UTC(2024, 0, 15), Date.UTC(2024, 6, 15)] as const;

function winterMinutes(zone: string): number {
	return Math.min(...seasons.map(offsetAtOf(zone)));
}

function isChanging(zone: string): boolean {
	const [winter, summer] = seasons.map(offsetAtOf(zone));
	return winter !== summer;
}

/** Where clocks of an offset are put forward: the site itself, else the place best known for it. */
function regionOf(minutes: number, siteZone: string): string | null {
	if (isChanging(siteZone) && winterMinutes(siteZone) === minutes) return siteZone;
	return changing[minutes] ?? null;
}

/**
 * The zones that a fixed offset may mean where the file says that its clock keeps summer time: the offset with the hour
 * put on, without it, or by the season. In a season without summer time nothing is open.
 */
export function withDaylight(zone: string, siteZone: string, firstLocalMs: number): readonly string[] {
	const minutes = /^[+-]/.test(zone) ? fixedOffsetOf(zone) : null;
	if (minutes === null) return [zone];
	const region = regionOf(minutes, siteZone);
	if (region === null) return [offsetText(minutes + hour), zone];
	const isSummer =
		Number.isNaN(firstLocalMs) || offsetAtOf(region)(firstLocalMs - minutes * 60_000) !== minutes;
	return isSummer ? [offsetText(minutes + hour), zone, region] : [region, zone];
}

/** The same for a place whose clock, so the file says, is not put forward. */
export function withoutDaylight(zone: string): readonly string[] {
	return /^[+-]/.test(zone) || !isChanging(zone) ? [zone] : [offsetText(winterMinutes(zone)), zone];
}

/** Zones to offer where the file names one that nobody knows: the site's first. */
export function zonesToOffer(siteZone: string): readonly string[] {
	return [siteZone, 'UTC', 'Europe/Berlin', 'America/New_York', 'Asia/Shanghai'];
}
