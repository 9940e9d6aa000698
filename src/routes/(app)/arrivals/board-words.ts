import { partText } from '$lib/messages/en/line-groups';
import type { MarkKind } from '$lib/components/ui/mark';
import type { TemperatureUnit } from '$lib/domain/units';
import { count, duration, lifeDays, temperature, temperatureSign } from '$lib/format';
import { shortDay, time, zoneName } from '$lib/format-time';
import type { BoardRow, BoardView } from '$lib/schemas/board';
import type { Stage } from '$lib/schemas/docket';

/** The groups of the board, in their order. */
export const groups: readonly { stage: Stage; name: string; short: string }[] = [
	{ stage: 'at-the-door', name: 'At the door', short: 'Door' },
	{ stage: 'on-hold', name: 'On hold', short: 'Hold' },
	{ stage: 'expected', name: 'Expected', short: 'Expected' },
	{ stage: 'done', name: 'Done', short: 'Done' }
];

const verdicts: Record<string, { word: string; mark: MarkKind | null }> = {
	accepted: { word: 'Accepted', mark: 'accept' },
	conditions: { word: 'With conditions', mark: 'conditions' },
	rejected: { word: 'Rejected', mark: 'reject' }
};

export function verdictOf(row: BoardRow): { word: string; mark: MarkKind | null } {
	if (row.stage === 'at-the-door') return { word: 'At the door', mark: 'at-the-door' };
	if (row.stage === 'on-hold') return { word: 'On hold', mark: 'hold' };
	if (row.stage === 'expected') return { word: 'Expected', mark: 'expected' };
	// Some in, some refused: no tick over a part, its quantities say it.
	if (row.part)
		return {
			word: partText(row.part).replace(` ${row.part.unit}`, ''),
			mark: null
		};
	return verdicts[row.verdict ?? 'accepted'] ?? { word: 'Done', mark: null };
}

/** `R. Calloway`: a stub has no room for more. */
function initialed(name: string): string {
	const [first, ...rest] = name.split(' ');
	return rest.length > 0 && first ? `${first[0]}. ${rest.join(' ')}` : name;
}

/** A time, with its day where that is not the board's. */
function timeOn(at: string, dayOn: string, zone: string): string {
	const day = new Date(at).toLocaleDateString('sv-SE', { timeZone: zone });
	return day === dayOn ? time(at, zone) : `${shortDay(at, zone, 'en')} ${time(at, zone)}`;
}

/** The line under the verdict: since when, until when, in how long, or who decided. */
export function clockLine(row: BoardRow, nowMs: number, dayOn: string, zone: string): string {
	if (row.stage === 'done')
		return row.decided ? `${initialed(row.decided.by)} ${timeOn(row.decided.at, dayOn, zone)}` : '';
	if (row.stage === 'on-hold' && row.rejectBy)
		return `reject by ${timeOn(row.rejectBy.deadlineAt, dayOn, zone)}`;
	if (row.arrivedAt) return duration(nowMs - Date.parse(row.arrivedAt));
	if (!row.dueAt) return 'no time given';
	const ms = Date.parse(row.dueAt) - nowMs;
	return ms >= 0 ? `in ${duration(ms)}` : `late by ${duration(ms)}`;
}

function loggers(n: number): string {
	return n === 1 ? '1 logger' : `${n} loggers`;
}

export function readsText({ stage, reads }: BoardRow): string {
	if (stage === 'expected') return reads.due === 0 ? 'no logger due' : `${loggers(reads.due)} due`;
	return reads.due === 0 ? 'no logger' : `${reads.kept} of ${reads.due} read`;
}

/** The gravest thing the reads say, under their count. */
export function findingText(row: BoardRow, unit: TemperatureUnit): string {
	const { finding } = row;
	if (finding?.kind === 'excursion')
		return `E${finding.ordinal} ${finding.severity}, ${temperature(finding.extremeCelsius, unit, 'en')} ${temperatureSign(unit)}`;
	if (finding?.kind === 'short')
		return `Low of ${lifeDays(finding.lowHours, 'en')} d, need ${lifeDays(finding.neededHours, 'en')} d`;
	if (finding?.kind === 'question') return `A question about ${finding.fileName}`;
	if (row.stage === 'at-the-door' && row.reads.kept < row.reads.due) return 'Open to reach loggers';
	return '';
}

export function nextText({ next }: BoardRow): string {
	if (next.act === 'answer')
		return next.questions === 1 ? 'Answer 1 question' : `Answer ${next.questions} questions`;
	return {
		'log-arrival': 'Log arrival',
		upload: 'Upload a read',
		review: 'Review',
		sign: 'Sign',
		open: 'Open'
	}[next.act];
}

export function goodsText({ goods }: BoardRow, isShort = false): string {
	const cases = `${count(goods.cases, 'en')} ${goods.cases === 1 ? goods.unit : `${goods.unit}s`}`.replace(
		/xs$/,
		'xes'
	);
	return [goods.product, !isShort && goods.lots > 1 ? `${goods.lots} lots` : '', cases]
		.filter(Boolean)
		.join(', ');
}

/** A board says the running part of the number; the site and the year are those of the page. */
export function shortNumber(number: string): string {
	return number.split('-').at(-1) ?? number;
}

/** The group in one line, so that the heads alone tell the day. */
export function groupFinding(stage: Stage, rows: readonly BoardRow[], nowMs: number): string {
	if (rows.length === 0) return '';
	if (stage === 'at-the-door') return 'unload after the read';
	if (stage === 'on-hold') return 'waiting for QA';
	if (stage === 'expected') return nextDue(rows, nowMs);
	return [
		['accepted', 'accepted'],
		['conditions', 'with conditions'],
		['part', 'in part'],
		['rejected', 'rejected']
	]
		.map(([verdict, word]) => ({ n: rows.filter((row) => row.verdict === verdict).length, word }))
		.filter(({ n }) => n > 0)
		.map(({ n, word }) => `${n} ${word}`)
		.join(', ');
}

function nextDue(rows: readonly BoardRow[], nowMs: number): string {
	const next = rows.find((row) => row.dueAt !== null && Date.parse(row.dueAt) >= nowMs);
	if (!next?.dueAt) return 'all of them late';
	const where = next.dock ? `, ${next.dock.toLowerCase()}` : '';
	return `next in ${duration(Date.parse(next.dueAt) - nowMs)}${where}`;
}

/** Under the title: what day it is and when the docks are open. */
export function openingText({ opensAt, closesAt, holiday, dayOn }: BoardView, zone: string): string {
	const hours =
		opensAt && closesAt
			? `docks open ${time(opensAt, zone)} to ${time(closesAt, zone)} ${zoneName(opensAt, zone)}`
			: 'docks closed';
	const noon = `${dayOn}T12:00:00Z`;
	const day = new Intl.DateTimeFormat('en-GB', {
		weekday: 'long',
		day: 'numeric',
		month: 'long',
		timeZone: 'UTC'
	});
	return [day.format(new Date(noon)).replace(',', ''), holiday, hours].filter(Boolean).join(', ');
}

/** The open rejection clock that runs out first. */
export function nearestClock(rows: readonly BoardRow[]) {
	return rows
		.flatMap(({ number, rejectBy }) => (rejectBy ? [{ number, ...rejectBy }] : []))
		.sort((a, b) => a.deadlineAt.localeCompare(b.deadlineAt))[0];
}

/** More than this behind its time, an arrival is late. */
const lateMs = 15 * 60_000;

export function isLate({ dueAt, arrivedAt }: BoardRow): boolean {
	return dueAt !== null && arrivedAt !== null && Date.parse(arrivedAt) - Date.parse(dueAt) > lateMs;
}
