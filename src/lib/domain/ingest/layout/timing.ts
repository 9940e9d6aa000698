import type { Column } from './columns';

/** Which columns hold the time of a row, and in what form. */
export type Timing =
	| { readonly kind: 'moment'; readonly column: number }
	| { readonly kind: 'date-and-time'; readonly date: number; readonly time: number }
	| { readonly kind: 'date'; readonly column: number }
	| { readonly kind: 'time-of-day'; readonly column: number }
	| { readonly kind: 'epoch'; readonly column: number; readonly unit: 's' | 'ms' | 'us' }
	| { readonly kind: 'serial-day'; readonly column: number }
	| { readonly kind: 'elapsed'; readonly column: number; readonly unitMs: number | null }
	| { readonly kind: 'none' };

const mostly = 0.5;

/** A second clock (received, exported) yields to the one that says when it was measured; UTC yields to nothing. */
function preferred(columns: readonly Column[]): Column | undefined {
	const rank = (column: Column): number =>
		(column.meaning.isOtherClock ? 4 : 0) +
		(column.meaning.isTime || column.name === '' ? 0 : 2) +
		(/utc|gmt/i.test(column.name) ? -1 : 0);
	return [...columns].sort((a, b) => rank(a) - rank(b) || a.index - b.index)[0];
}

function elapsedUnitMs(column: Column): number | null {
	const text = column.name.toLowerCase();
	if (/\bms\b|milli/.test(text)) return 1;
	if (/\bs\b|sec|sek|\[s\]/.test(text)) return 1000;
	if (/\bmin/.test(text)) return 60_000;
	if (/\bh\b|hour|stund|heure|hora|ore\b/.test(text)) return 3_600_000;
	return /\bd\b|day|tag|jour/.test(text) ? 86_400_000 : null;
}

/** Finds the time of a row among the columns; what the cells are counts before what the heads say. */
export function findTiming(columns: readonly Column[]): Timing {
	const elapsed = columns.find(
		(c) =>
			c.meaning.isElapsed && !c.meaning.isOtherClock && c.share.number + c.share.time + c.share.text > mostly
	);
	const moment = preferred(columns.filter((c) => c.share.moment > mostly));
	if (moment !== undefined) return { kind: 'moment', column: moment.index };
	const epoch = preferred(
		columns.filter(
			(c) =>
				c.epochUnit !== null &&
				(c.meaning.isTime || c.name === '' || c.isCounter || c.meaning.quantity === null)
		)
	);
	if (epoch !== undefined && epoch.epochUnit !== null)
		return { kind: 'epoch', column: epoch.index, unit: epoch.epochUnit };
	const date = preferred(columns.filter((c) => c.share.date > mostly));
	const time = preferred(
		columns.filter((c) => c.share.time > mostly && !(c.meaning.isElapsed && date === undefined))
	);
	if (date !== undefined && time !== undefined)
		return { kind: 'date-and-time', date: date.index, time: time.index };
	if (elapsed !== undefined)
		return { kind: 'elapsed', column: elapsed.index, unitMs: elapsedUnitMs(elapsed) };
	if (date !== undefined) return { kind: 'date', column: date.index };
	if (time !== undefined) return { kind: 'time-of-day', column: time.index };
	const serial = columns.find(
		(c) => c.meaning.isTime && c.share.number > mostly && c.low > 20_000 && c.high < 80_000 && !c.isCounter
	);
	if (serial !== undefined) return { kind: 'serial-day', column: serial.index };
	const running = columns.find(
		(c) => c.meaning.isTime && c.isCounter && c.share.number > mostly && elapsedUnitMs(c) !== null
	);
	return running === undefined
		? { kind: 'none' }
		: { kind: 'elapsed', column: running.index, unitMs: elapsedUnitMs(running) };
}

/** The columns a timing takes for itself. */
export function columnsOf(timing: Timing): readonly number[] {
	if (timing.kind === 'none') return [];
	return timing.kind === 'date-and-time' ? [timing.date, timing.time] : [timing.column];
}
