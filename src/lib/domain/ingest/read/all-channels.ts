import type { Channel } from '../ingestion';
import { quantityOf, type Column } from '../layout/columns';
import { channelOf, type ChannelHead } from './channels';
import { gatherValues } from './gather';
import type { GatheredValues } from './gathered';
import type { Readable } from './readable';
import { seriesOf, type Series } from './series';

/** So many cells are held at once beside the primary channel; further columns are read in turns. */
const cellsAtOnce = 4_000_000;

/** Columns read in one pass beside the rows' times: all of them where that is not too much. */
export function columnsAtOnce(rows: number): number {
	return Math.max(1, Math.floor(cellsAtOnce / Math.max(1, rows)));
}

/** What a column is called; its place where it has no head. */
export function nameOf(column: Column): string {
	return column.name === '' ? String(column.index + 1) : column.name;
}

function headOf(readable: Readable, column: Column, isPrimary: boolean): ChannelHead {
	const { gathered, unit, unitOf } = readable;
	const quantity = isPrimary ? 'temperature' : (quantityOf(column) ?? 'other');
	const own = isPrimary ? unit : quantity === 'temperature' ? unitOf(column) : column.unit;
	const written = column.unitText === '' ? (unitInHead(column.name) ?? null) : column.unitText;
	return {
		name: nameOf(column),
		quantity,
		unit: own ?? written,
		isPrimary,
		shortRows: gathered.faults.filter(({ code }) => code === 'short-row').length
	};
}

/** A unit in brackets at the end of a head, or its last word where that is a sign: `RH (%)`, `Light [lx]`, `%RH`. */
function unitInHead(name: string): string | undefined {
	const bracketed = /[([]([^()[\]]{1,12})[)\]]\s*$/.exec(name)?.[1]?.trim();
	return (
		bracketed ??
		/(?:^|[\s_])(%\s?r\.?h\.?|%|lx|lux|hpa|kpa|mbar|ppm|mv|v|g)$/i.exec(name)?.[1] ??
		/^%\s?rh/i.exec(name)?.[0]
	);
}

function otherChannel(readable: Readable, column: Column, values: GatheredValues): Channel {
	const { axis, gathered, unitOf } = readable;
	const head = headOf(readable, column, false);
	const unit = head.quantity === 'temperature' && !values.hasMixedUnits ? unitOf(column) : null;
	const ms = axis.ms.subarray(0, gathered.count);
	const series = seriesOf(values, ms, gathered.lines, unit ?? 'celsius', unit !== null);
	return channelOf(head, series, unit !== null);
}

/** The primary channel first, then all others in the order of their columns. */
export function channelsOf(readable: Readable, primary: Series): Channel[] {
	const { table, gathered, picked, column } = readable;
	const channels = [channelOf(headOf(readable, column, true), primary, true)];
	const others = picked.others.filter(({ index }) => index !== column.index);
	const perPass = columnsAtOnce(gathered.count);
	for (let at = 0; at < others.length; at += perPass) {
		const batch = others.slice(at, at + perPass);
		const unread = batch.filter(({ index }) => !gathered.values.some((known) => known.column === index));
		const read =
			unread.length === 0
				? []
				: gatherValues(
						table,
						gathered,
						unread.map(({ index }) => index)
					);
		for (const other of batch) {
			const values = [...gathered.values, ...read].find((known) => known.column === other.index);
			if (values !== undefined) channels.push(otherChannel(readable, other, values));
		}
	}
	return channels;
}
