import type { MarkKind } from '$lib/components/ui/mark';
import { duration } from '$lib/format';
import { dayTime, isoDay, time, zoneName } from '$lib/format-time';
import type { ReadState } from '$lib/schemas/read';

/** Each state's mark and word; kept is present, not accepted. */
export const readStateWords: Readonly<Record<ReadState, { mark: MarkKind; word: string }>> = {
	question: { mark: 'hold', word: 'Asks one question' },
	understood: { mark: 'at-the-door', word: 'Read, not kept yet' },
	kept: { mark: 'accept', word: 'Kept' },
	refused: { mark: 'reject', word: 'Cannot be read' },
	withdrawn: { mark: 'expected', word: 'Withdrawn' }
};

/** Where a sensor rode. */
export const placementWords = {
	air: 'In the air',
	'between-cases': 'Between cases',
	'in-product': 'In the product'
} as const;

/** Who says which zone a file's times are in. */
export const zoneByWords = {
	file: 'as the file says',
	answer: 'as answered here',
	site: 'assumed, the site’s'
} as const;

/** How far apart readings are: `10 min`, `30 s`, `2 h`. */
export function everyWords(intervalMs: number): string {
	if (intervalMs > 0 && intervalMs < 60_000) return `${Math.round(intervalMs / 1000)} s`;
	return duration(intervalMs);
}

/** The quantity of a channel. */
export const quantityWords = {
	temperature: 'temperature',
	humidity: 'humidity',
	'dew-point': 'dew point',
	light: 'light',
	shock: 'shock',
	other: 'other'
} as const;

/** From the first reading to the last; the day once where it is one day. */
export function spanWords(firstMs: number, lastMs: number, zone: string): string {
	const isOneDay = isoDay(firstMs, zone) === isoDay(lastMs, zone);
	const last = isOneDay ? time(lastMs, zone) : dayTime(lastMs, zone, 'en');
	return `${dayTime(firstMs, zone, 'en')} to ${last} ${zoneName(lastMs, zone)}`;
}
