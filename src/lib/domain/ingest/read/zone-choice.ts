import type { ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';
import { emptyStamp, noOffset, scanStamp } from '../times/stamp';
import { fixedOffsetOf, isZone, offsetAtOf, offsetText } from '../times/zone';
import { zoneMeanings } from '../times/zone-words';
import { withDaylight, withoutDaylight, zonesToOffer } from './daylight-choice';
import type { Gathered } from './gathered';

export interface UsedZone {
	readonly zone: string;
	readonly by: 'file' | 'answer' | 'site';
}

const file = (zone: string): UsedZone => ({ zone, by: 'file' });

/** Offsets that rows of the file carry themselves. */
function offsetsIn({ times, count }: Gathered): { all: boolean; distinct: ReadonlySet<number> } {
	const distinct = new Set<number>();
	let [withOffset, last] = [0, noOffset];
	for (let i = 0; i < count; i++) {
		const offset = times.offsetMinutes[i] ?? noOffset;
		if (offset === noOffset) continue;
		withOffset++;
		if (offset !== last) distinct.add(offset);
		last = offset;
	}
	return { all: count > 0 && withOffset === count, distinct };
}

/** The site's own zone where its clocks go with the region's: people know it by that name. */
function nameFor(region: string, siteZone: string): string {
	const [winter, summer] = [Date.UTC(2024, 0, 15), Date.UTC(2024, 6, 15)];
	const [site, other] = [offsetAtOf(siteZone), offsetAtOf(region)];
	return site(winter) === other(winter) && site(summer) === other(summer) ? siteZone : region;
}

/** Letters beside each row say its offset; where several are meant, an offset of other rows tells the place. */
function ofRowWord(word: string, offsets: ReadonlySet<number>): UsedZone[] {
	const meanings = zoneMeanings(word);
	const fits = meanings.filter(({ minutes, region }) => {
		const at = offsetAtOf(region);
		const own = [at(Date.UTC(2024, 0, 15)), at(Date.UTC(2024, 6, 15))];
		return [...offsets].some((offset) => offset !== minutes && own.includes(offset));
	});
	return (fits.length > 0 ? fits : meanings).map(({ minutes }) => file(offsetText(minutes)));
}

/** Letters said once for the file: the place with its changes of clock, or the offset all year. */
function ofStatedWord(word: string, siteZone: string): UsedZone[] {
	const meanings = zoneMeanings(word);
	const regions = meanings.map(({ region }) => file(nameFor(region, siteZone)));
	return [...regions, ...meanings.map(({ minutes }) => file(offsetText(minutes)))];
}

/** A zone said outright: several where the file names several, or where summer time makes two of it. */
function ofStatedZone(
	zone: string,
	stated: Stated,
	{ siteZone }: ReadContext,
	firstLocalMs: number
): UsedZone[] {
	const named = stated.zonesNamed.length > 1 ? stated.zonesNamed : [zone];
	return named
		.flatMap((name) =>
			stated.isDaylight === true
				? withDaylight(name, siteZone, firstLocalMs)
				: stated.isDaylight === false
					? withoutDaylight(name)
					: [name]
		)
		.map(file);
}

const stamp = emptyStamp();

/** The offset that the stated start carries, where the first row shows the same clock. */
function ofStart(startText: string | null, firstLocalMs: number): UsedZone[] {
	if (startText === null || !scanStamp(startText, stamp) || stamp.offsetMinutes === noOffset) return [];
	const slackMs = 10 * 60_000;
	const clock = ((firstLocalMs % 86_400_000) + 86_400_000) % 86_400_000;
	const isSameClock = stamp.msOfDay >= 0 && Math.abs(clock - stamp.msOfDay) <= slackMs;
	return isSameClock ? [file(offsetText(stamp.offsetMinutes))] : [];
}

/**
 * The zones that the times of a file may be in, the likeliest first: an answer, the offsets of its rows, letters beside
 * them, what the file states, else the site's, assumed visibly.
 */
export function zonesFor(
	gathered: Gathered,
	stated: Stated,
	context: ReadContext,
	firstLocalMs: number
): readonly UsedZone[] {
	const { all, distinct } = offsetsIn(gathered);
	if (all) return [file(offsetText(gathered.times.offsetMinutes[0] ?? 0))];
	const { zone: answered } = context.answers;
	if (answered !== undefined && isZone(answered)) return [{ zone: answered, by: 'answer' }];
	const { zoneWord } = gathered;
	if (zoneWord !== null) {
		const meant =
			fixedOffsetOf(zoneWord) === null && isZone(zoneWord) ? [file(zoneWord)] : ofRowWord(zoneWord, distinct);
		if (meant.length > 0) return meant;
	}
	if (stated.zone !== null) return ofStatedZone(stated.zone, stated, context, firstLocalMs);
	if (stated.zoneWord !== null) {
		const meant = ofStatedWord(stated.zoneWord, context.siteZone);
		if (meant.length > 0) return meant;
	}
	const ofOwnStart = ofStart(stated.startText, firstLocalMs);
	if (ofOwnStart.length > 0) return ofOwnStart;
	if (stated.zoneUnknown !== null) return zonesToOffer(context.siteZone).map(file);
	const sites = stated.isDaylight === false ? withoutDaylight(context.siteZone) : [context.siteZone];
	return sites.map((zone) => ({ zone, by: 'site' }));
}

/** Why the zone has to be asked about. */
export function whyZone({ zone, zoneWord, zonesNamed, zoneUnknown, isDaylight }: Stated): string {
	if (zonesNamed.length > 1) return 'several-zones';
	if (isDaylight !== null) return 'daylight';
	return zone === null && zoneWord === null && zoneUnknown !== null ? 'unknown-zone' : 'no-zone';
}

/** One zone with the instants it gives. */
export interface Placed<T> {
	readonly zone: UsedZone;
	readonly placed: T;
}

const uploadSlackMs = 15 * 60_000;
const mostChoices = 3;

function isSame(a: Float64Array, b: Float64Array): boolean {
	return a.length === b.length && a.every((ms, i) => ms === b[i] || (Number.isNaN(ms) && Number.isNaN(b[i])));
}

function lastOf(ms: Float64Array): number {
	let last = -Infinity;
	for (const at of ms) if (at > last) last = at;
	return last;
}

/** The zones that give different instants, without those under which the file would end after its upload. */
export function distinctZones<T extends { readonly ms: Float64Array }>(
	zones: readonly UsedZone[],
	place: (zone: string) => T,
	uploadedMs: number
): readonly Placed<T>[] {
	const found: Placed<T>[] = [];
	for (const zone of zones) {
		const placed = place(zone.zone);
		if (!found.some((other) => isSame(other.placed.ms, placed.ms))) found.push({ zone, placed });
	}
	if (found.length < 2) return found;
	const past = found.filter(({ placed }) => lastOf(placed.ms) <= uploadedMs + uploadSlackMs);
	return (past.length > 0 ? past : found).slice(0, mostChoices);
}
