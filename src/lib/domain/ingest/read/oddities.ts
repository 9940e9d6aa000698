import type { Oddity, ReadContext } from '../ingestion';
import type { Gathered } from './gathered';
import type { Intervals } from './intervals';
import type { Series } from './series';

const shownLines = 12;

/** One oddity with its first few lines; null when it did not happen. */
export function oddityOf(
	code: Oddity['code'],
	lines: readonly number[],
	detail: string | null = null
): Oddity | null {
	return lines.length === 0 ? null : { code, count: lines.length, lines: lines.slice(0, shownLines), detail };
}

const minutes = (ms: number): string => String(Math.round((ms / 60_000) * 1000) / 1000);

/** What the readings themselves show: repeats, holes, order, intervals, a clock ahead of the upload. */
export function seriesOddities(series: Series, intervals: Intervals, context: ReadContext): Oddity[] {
	const { times, lines } = series;
	const future: number[] = [];
	let first = times.length;
	while (first > 0 && (times[first - 1] ?? 0) > context.uploadedMs) first--;
	for (let i = first; i < times.length; i++) future.push(lines[i] ?? 0);
	const { changed } = intervals;
	const longest = intervals.gaps.reduce(
		(most, i) => Math.max(most, (times[i] ?? 0) - (times[i - 1] ?? 0)),
		0
	);
	return [
		oddityOf('duplicate-dropped', series.dropped),
		oddityOf('duplicate-conflict', series.conflicting),
		oddityOf('missing-value', series.missing),
		oddityOf('impossible-value', series.impossible),
		oddityOf('resorted', series.resorted, series.isDescending ? 'descending' : null),
		oddityOf(
			'gap',
			intervals.gaps.map((i) => lines[i] ?? 0),
			minutes(longest)
		),
		oddityOf(
			'interval-changed',
			changed === null ? [] : [lines[changed.at] ?? 0],
			changed === null ? null : `${minutes(changed.fromMs)} > ${minutes(changed.toMs)}`
		),
		oddityOf('future-reading', future)
	].filter((oddity) => oddity !== null);
}

/** What the rows of the file show: lines that are no readings. */
export function rowOddities(gathered: Gathered): Oddity[] {
	const linesOf = (code: string): number[] =>
		gathered.faults.filter((fault) => fault.code === code).map(({ line }) => line);
	return [
		oddityOf('bad-time', linesOf('bad-time')),
		oddityOf('short-row', linesOf('short-row')),
		oddityOf('header-repeated', linesOf('header-repeated')),
		oddityOf('cut-short', linesOf('cut-short')),
		oddityOf('footer-ignored', gathered.footerLines)
	].filter((oddity) => oddity !== null);
}
