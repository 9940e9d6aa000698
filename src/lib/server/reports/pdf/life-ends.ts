import type { Content } from 'pdfmake/interfaces';
import { msPerHour } from '../../../domain/units';
import { decidedGroups } from '../../../domain/receiving/line-groups';
import type { DocketLineView } from '../../../schemas/docket';
import { hairline, linesShown, pair } from './counterfoil-parts';
import type { Draft } from './draft';
import { palette } from './palette';
import type { Calendar } from './text';
import { label, sentence } from './type-styles';

/**
 * "Life ends about", low to high, for what was taken in: kept at the spec's reference temperature from the last reading
 * on. Never called "use by": that is a regulated date mark. Source: Regulation (EU) No 1169/2011, article 24.
 */
export function lifeEnds(draft: Draft): Content[] {
	const { docket, thermometer, sheet } = draft;
	const taken = docket.lines.filter((line) =>
		decidedGroups(line).some(({ outcome }) => outcome !== 'reject')
	);
	const rows = taken.flatMap((line) => endOf(draft, line));
	if (rows.length === 0) return [];
	const temperatures = [...new Set(taken.map((line) => thermometer.reading(line.referenceCelsius)))];
	const isOne = temperatures.length === 1;
	const kept = isOne ? `kept at ${temperatures[0]} ${thermometer.sign}` : 'kept at its spec’s temperature';
	const more = rows.length - linesShown;
	return [
		hairline(sheet.stubWidth, 6),
		label('Life ends about'),
		label(kept, { margin: [0, 0, 0, 2] }),
		...rows.slice(0, linesShown),
		...(more > 0 ? [sentence(`and ${more} more`)] : [])
	];
}

function endOf({ docket, calendar, sheet }: Draft, line: DocketLineView): Content[] {
	const assessment = docket.assessments.find((one) => one.lineId === line.id && one.isGoverning);
	if (assessment === undefined || line.remainingHours === null) return [];
	const fromMs = Date.parse(assessment.windowToAt);
	const endMs = (hours: number) => fromMs + Math.max(hours, 0) * msPerHour;
	const text = dayRange(calendar, fromMs, endMs(line.remainingHours.low), endMs(line.remainingHours.high));
	return [pair(`Line ${line.ordinal}`, sentence(text, { color: palette.ink }), sheet.stubWidth * 1.3)];
}

/** "14 Apr", "15–16 Apr", "30 Apr–2 May"; with the year where it is not that of the last reading. */
export function dayRange(calendar: Calendar, fromMs: number, lowMs: number, highMs: number): string {
	const [from, low, high] = [calendar.at(fromMs), calendar.at(lowMs), calendar.at(highMs)];
	const dated = high.year === from.year ? 'd LLL' : 'd LLL yy';
	if (low.hasSame(high, 'day')) return high.toFormat(dated);
	const first = low.hasSame(high, 'month') ? 'd' : low.hasSame(high, 'year') ? 'd LLL' : 'd LLL yy';
	return `${low.toFormat(first)}–${high.toFormat(dated)}`;
}
