import type { Decision, Declared, Ingestion, Layout, Oddity, ReadContext } from '../ingestion';
import { layoutFingerprint } from '../layout/fingerprint';
import type { Stated } from '../layout/preamble';
import { columnsOf } from '../layout/timing';
import { channelsOf } from './all-channels';
import { decisionsOf, unusedAnswers } from './decisions';
import { proposeClock } from './clock-proposal';
import { exampleRows } from './example-rows';
import type { Gathered } from './gathered';
import { momentMs } from './instants';
import { intervalsOf } from './intervals';
import { oddityOf, rowOddities, seriesOddities } from './oddities';
import type { Readable } from './readable';
import { refused } from './refusals';
import { seriesOf, type Series } from './series';
import type { TimeAxis } from './time-axis';
import { twinOddities } from './twins';

/** What the preamble declares, in UTC where the times of the file are understood. */
export function declaredBy(stated: Stated, axis: TimeAxis | null, context: ReadContext): Declared {
	const zone = axis?.zone.zone ?? stated.zone ?? context.siteZone;
	return {
		serial: stated.serial,
		tripName: stated.tripName,
		startMs: context.answers.startMs ?? momentMs(stated.startText, axis?.order ?? null, zone),
		intervalMinutes: stated.intervalMinutes,
		zone: stated.zone
	};
}

function layoutOf({ table, encoding, axis, values, gathered }: Readable): Layout {
	return {
		kind: table.kind,
		encoding,
		delimiter: table.delimiter,
		decimalComma: table.kind === 'delimited' && values.commaCount * 2 > gathered.count,
		headerLine: table.headerLine,
		dateOrder: axis.order,
		dateOrderBy: axis.orderBy,
		zone: axis.zone.zone,
		zoneBy: axis.zone.by,
		fingerprint: layoutFingerprint(table.kind, table.delimiter, table.makeHeader ?? table.header)
	};
}

function axisOddities({ axis, gathered, declared, stated }: Readable, series: Series): Oddity[] {
	const line = (row: number): number => gathered.lines[row] ?? 0;
	const first = [line(0)];
	const isAssumed = axis.isLocal && axis.zone.by === 'site';
	// Times counted back from their receipt lie before it: only a start that the file states is one.
	const startMs = stated.startText === null ? null : declared.startMs;
	const early: number[] = [];
	for (
		let i = 0;
		startMs !== null && i < series.times.length && (series.times[i] ?? 0) < startMs - 60_000;
		i++
	)
		early.push(series.lines[i] ?? 0);
	const badDays: number[] = [];
	for (let i = 0; i < gathered.count; i++)
		if (Number.isNaN(axis.ms[i]) && axis.setAside?.has(i) !== true) badDays.push(line(i));
	return [
		oddityOf('bad-time', badDays),
		oddityOf('zone-assumed', isAssumed ? first : [], axis.zone.zone),
		oddityOf(
			'clock-change',
			axis.change === null ? [] : axis.changeRows.length === 0 ? first : axis.changeRows.map(line),
			axis.change
		),
		oddityOf('date-order-by-journey', axis.orderBy === 'journey' ? first : [], axis.order),
		oddityOf('date-order-by-upload', axis.orderBy === 'upload' ? first : [], axis.order),
		oddityOf('before-start', early)
	].filter((oddity) => oddity !== null);
}

/** Joins oddities of one code that two steps found. */
function merged(oddities: readonly Oddity[]): Oddity[] {
	const byCode = new Map<string, Oddity>();
	for (const oddity of oddities) {
		const key = `${oddity.code} ${oddity.detail ?? ''}`;
		const known = byCode.get(key);
		byCode.set(
			key,
			known === undefined
				? oddity
				: {
						...known,
						count: known.count + oddity.count,
						lines: [...known.lines, ...oddity.lines].sort((a, b) => a - b)
					}
		);
	}
	return [...byCode.values()];
}

/** Answers without a use are told at the first reading. A part is settled outside the table. */
function notUsed(decisions: readonly Decision[], { lines }: Gathered, context: ReadContext): Oddity[] {
	const fields = unusedAnswers(decisions, context).filter((field) => field !== 'part');
	const told = oddityOf('answer-unused', fields.length > 0 ? [lines[0] ?? 0] : [], fields.join(', '));
	return told === null ? [] : [told];
}

/** From settled columns, times and unit to the understanding that is shown and kept. */
export function understand(readable: Readable, context: ReadContext): Ingestion {
	const { table, timing, gathered, axis, column, values, unit, declared } = readable;
	const ms = axis.ms.subarray(0, gathered.count);
	const series = seriesOf(values, ms, gathered.lines, unit);
	const count = series.times.length;
	if (count === 0) return refused('no-readings', gathered.lines[0] ?? null, column.name);
	if (count === 1)
		return refused(
			gathered.count - series.missing.length > 1 ? 'no-time-progress' : 'one-reading',
			series.lines[0] ?? null,
			null
		);
	const intervals = intervalsOf(series.times);
	const layout = layoutOf(readable);
	const [timeColumn] = columnsOf(timing);
	const subjectOf = (row: number): string =>
		timeColumn === undefined ? '' : (table.cells(row)[timeColumn] ?? '').trim();
	const decisions = decisionsOf(readable, layout.decimalComma, context);
	return {
		kind: 'ok',
		understanding: {
			layout,
			decisions,
			declared,
			channels: channelsOf(readable, series),
			temperature: 0,
			readings: count,
			firstMs: series.times[0] ?? 0,
			lastMs: series.times[count - 1] ?? 0,
			usualIntervalMs: intervals.usualMs,
			clockProposal: proposeClock(
				{ lastMs: series.times[count - 1] ?? 0, usualIntervalMs: intervals.usualMs },
				context
			),
			oddities: merged([
				...rowOddities(gathered),
				...seriesOddities(series, intervals, context),
				...twinOddities(readable),
				...axisOddities(readable, series),
				...notUsed(decisions, gathered, context),
				...(table.oddities ?? []),
				...(axis.oddities ?? [])
			]),
			rows: exampleRows(table, gathered.rows, gathered.count, subjectOf)
		}
	};
}
