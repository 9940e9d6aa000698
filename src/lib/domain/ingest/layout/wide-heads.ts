import { monthOfName, monthsMeant } from '../times/month-names';

/** Heads that are themselves times: hours of a day or months of a year, one column each. */
export interface WideHeads {
	readonly kind: 'hours' | 'months';
	/** First of the columns, and the text that completes the row's date in each. */
	readonly from: number;
	readonly texts: readonly string[];
}

const clockHead =
	/^(?:h|hr|hour|std|uhr|t)?[\s_]*(\d{1,2})(?:[:.h](\d{2})(?::00)?|\s*(?:h|hr|hrs|uhr|am|pm))?$/i;
/** Fewer columns of hours are a coincidence of probe numbers. */
const fewestHours = 12;

/** Minutes since midnight that a head names; null when it names none. */
function minutesOf(head: string): number | null {
	const match = clockHead.exec(head.trim());
	if (match === null) return null;
	const half = /(am|pm)$/i.exec(head.trim())?.[1]?.toLowerCase();
	const hour = Number(match[1]);
	const minutes =
		(half === undefined ? hour : (hour % 12) + (half === 'pm' ? 12 : 0)) * 60 + Number(match[2] ?? 0);
	return minutes <= 1440 && Number(match[2] ?? 0) < 60 ? minutes : null;
}

function hoursIn(header: readonly string[]): WideHeads | null {
	const from = header.findIndex((head, i) => i > 0 && minutesOf(head) !== null);
	if (from < 0) return null;
	const texts: string[] = [];
	let [last, step] = [-1, 0];
	for (const head of header.slice(from)) {
		const minutes = minutesOf(head);
		if (minutes === null || minutes <= last) break;
		if (texts.length === 1) step = minutes - last;
		if (texts.length > 1 && minutes - last !== step) return null;
		last = minutes;
		texts.push(
			`${String(Math.floor(minutes / 60)).padStart(2, '0')}:${String(minutes % 60).padStart(2, '0')}`
		);
	}
	return texts.length >= fewestHours && step * texts.length >= 12 * 60
		? { kind: 'hours', from, texts }
		: null;
}

function monthsIn(header: readonly string[]): WideHeads | null {
	const isMonth = (head: string, month: number): boolean => {
		const bare = head.trim();
		const named = /^\d{1,2}$/.test(bare) ? Number(bare) : /^\p{L}+\.?$/u.test(bare) ? monthOfName(bare) : 0;
		return named === month || monthsMeant(named)?.includes(month) === true;
	};
	const isNumber = (head: string | undefined): boolean => /^\s*\d+\s*$/.test(head ?? '');
	for (let from = 1; from + 12 <= header.length; from++) {
		// 1 … 12 within 0 … 23 are hours.
		const isPart = isNumber(header[from]) && (isNumber(header[from - 1]) || isNumber(header[from + 12]));
		if (
			!isPart &&
			Array.from({ length: 12 }, (_, m) => m).every((m) => isMonth(header[from + m] ?? '', m + 1))
		)
			return {
				kind: 'months',
				from,
				texts: Array.from({ length: 12 }, (_, m) => String(m + 1).padStart(2, '0'))
			};
	}
	return null;
}

/** Finds columns of hours or months among the heads of a table; null when there are none. */
export function wideHeadsIn(header: readonly string[]): WideHeads | null {
	return header.length < fewestHours ? null : (monthsIn(header) ?? hoursIn(header));
}
