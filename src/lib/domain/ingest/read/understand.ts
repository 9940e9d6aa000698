import type { TemperatureUnit } from '../../units';
import { celsiusFromScaled } from '../../units';
import type { Channel, Declared, Ingestion, Layout, Oddity, ReadContext } from '../ingestion';
import { quantityOf, type Column } from '../layout/columns';
import { layoutFingerprint } from '../layout/fingerprint';
import type { Stated } from '../layout/preamble';
import type { Table } from '../layout/table';
import { columnsOf, type Timing } from '../layout/timing';
import { channelOf, namedChannel } from './channels';
import { exampleRows } from './example-rows';
import type { Gathered, GatheredValues } from './gathered';
import { momentMs } from './instants';
import { intervalsOf } from './intervals';
import { oddityOf, rowOddities, seriesOddities } from './oddities';
import type { Picked } from './pick-temperature';
import { refused } from './refusals';
import { seriesOf, type Series } from './series';
import type { TimeAxis } from './time-axis';

/** Everything that is settled about a table once no question is left. */
export interface Readable {
	readonly table: Table;
	readonly encoding: string;
	readonly timing: Timing;
	readonly picked: Picked;
	readonly gathered: Gathered;
	readonly axis: TimeAxis;
	readonly declared: Declared;
	readonly column: Column;
	readonly values: GatheredValues;
	readonly unit: TemperatureUnit;
	readonly unitOf: (column: Column) => TemperatureUnit | null;
}

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
		fingerprint: layoutFingerprint(table.kind, table.delimiter, table.header)
	};
}

/** Rows where the column in the other unit differs from the chosen one by more than both were rounded. */
function twinOddities({ picked, gathered, values, unit, unitOf }: Readable): Oddity[] {
	return picked.twins.flatMap((twin) => {
		const other = gathered.values.find((v) => v.column === twin.index);
		const otherUnit = unitOf(twin);
		if (other === undefined || otherUnit === null) return [];
		const apart: number[] = [];
		for (let i = 0; i < gathered.count; i++) {
			if (values.isMissing[i] === 1 || other.isMissing[i] === 1) continue;
			const mine = celsiusFromScaled(values.mantissa[i] ?? 0, values.decimals[i] ?? 0, unit);
			const theirs = celsiusFromScaled(other.mantissa[i] ?? 0, other.decimals[i] ?? 0, otherUnit);
			const rounding = 0.5 / 10 ** (values.decimals[i] ?? 0) + 0.5 / 10 ** (other.decimals[i] ?? 0);
			if (Math.abs(mine - theirs) > rounding + 1e-9) apart.push(gathered.lines[i] ?? 0);
		}
		const used = oddityOf('other-unit-column', [gathered.lines[0] ?? 0], twin.name);
		return [used, oddityOf('twin-disagrees', apart, twin.name)].filter((oddity) => oddity !== null);
	});
}

function axisOddities({ axis, gathered, declared }: Readable, series: Series): Oddity[] {
	const line = (row: number): number => gathered.lines[row] ?? 0;
	const first = [line(0)];
	const isAssumed = axis.isLocal && axis.zone.by === 'site';
	const { startMs } = declared;
	const early: number[] = [];
	for (
		let i = 0;
		startMs !== null && i < series.times.length && (series.times[i] ?? 0) < startMs - 60_000;
		i++
	)
		early.push(series.lines[i] ?? 0);
	const badDays: number[] = [];
	axis.ms.forEach((ms, i) => i < gathered.count && Number.isNaN(ms) && badDays.push(line(i)));
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

function nameOf(column: Column): string {
	return column.name === '' ? String(column.index + 1) : column.name;
}

/** From settled columns, times and unit to the understanding that is shown and kept. */
export function understand(readable: Readable, context: ReadContext): Ingestion {
	const { table, timing, picked, gathered, axis, column, values, unit, declared } = readable;
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
	const others: Channel[] = picked.others.map((other) =>
		namedChannel(nameOf(other), quantityOf(other) ?? 'other')
	);
	const [timeColumn] = columnsOf(timing);
	const subjectOf = (row: number): string =>
		timeColumn === undefined ? '' : (table.cells(row)[timeColumn] ?? '').trim();
	return {
		kind: 'ok',
		understanding: {
			layout: layoutOf(readable),
			declared,
			channels: [channelOf(nameOf(column), series), ...others],
			temperature: 0,
			readings: count,
			firstMs: series.times[0] ?? 0,
			lastMs: series.times[count - 1] ?? 0,
			usualIntervalMs: intervals.usualMs,
			oddities: merged([
				...rowOddities(gathered),
				...seriesOddities(series, intervals, context),
				...twinOddities(readable),
				...axisOddities(readable, series)
			]),
			rows: exampleRows(table, gathered.rows, gathered.count, subjectOf)
		}
	};
}
