import type { Column } from './columns';

/** Columns of a date that is written number by number; each null where the file has no such column. */
export interface DateParts {
	readonly year: number;
	readonly month: number;
	readonly day: number;
	/** Null where a clock stands in one cell. */
	readonly hour: number | null;
	readonly minute: number | null;
	readonly second: number | null;
	/** A clock with colons in place of hour and minute. */
	readonly clock: number | null;
	/** All of them, the year first. */
	readonly columns: readonly number[];
}

const heads = {
	year: /^\W*(year|yr|yyyy|jahr|annee|année|año|ano|anno|jaar|rok|yil|yıl|年)\W*$/i,
	month: /^\W*(month|mon|mo|mm|monat|mois|mes|mês|mese|maand|miesiac|miesiąc|ay|月)\W*$/i,
	day: /^\W*(day|dd|dy|tag|jour|dia|día|giorno|dag|dzien|dzień|gun|gün|日)\W*$/i,
	hour: /^\W*(hour|hr|hh|h|stunde|std|heure|hora|ora|uur|godzina|saat|时|時)\W*$/i,
	minute: /^\W*(minute|min|mi|mn|minuto|minuut|minuta|dakika|分)\W*$/i,
	second: /^\W*(second|sec|ss|sekunde|sek|seconde|segundo|secondo|saniye|秒)\W*$/i
} as const;

const bounds = {
	year: [0, 2200],
	month: [1, 12],
	day: [1, 31],
	hour: [0, 24],
	minute: [0, 59],
	second: [0, 60]
} as const;

/** Finds year, month, day and hour in columns of their own, or a clock for the last; null unless all are there. */
export function partsOf(columns: readonly Column[]): DateParts | null {
	const find = (part: keyof typeof heads): number | null => {
		const [low, high] = bounds[part];
		const column = columns.find(
			(c) => heads[part].test(c.name) && c.share.number > 0.5 && c.low >= low && c.high <= high
		);
		return column?.index ?? null;
	};
	const [year, month, day, hour] = [find('year'), find('month'), find('day'), find('hour')];
	const clock = hour === null ? columns.find((c) => c.share.time > 0.5)?.index : undefined;
	if (year === null || month === null || day === null || (hour === null && clock === undefined)) return null;
	const [minute, second] = [find('minute'), find('second')];
	return {
		year,
		month,
		day,
		hour,
		minute,
		second,
		clock: clock ?? null,
		columns: [year, month, day, hour, minute, second, clock ?? null].filter((column) => column !== null)
	};
}
