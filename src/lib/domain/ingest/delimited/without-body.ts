import type { RefusalCode } from '../ingestion';
import { meaningOf } from '../layout/words';
import { isHeaderOnly } from './body';
import { shapeOf } from './delimiter';
import { delimiters, splitRow } from './split-row';

interface Refused {
	readonly code: RefusalCode;
	readonly line: null;
	readonly found: string;
}

/** Text without rows of readings: heads alone, rows that hold no temperature, or no table at all. */
export function withoutBody(lines: readonly string[]): Refused {
	for (const [i, line] of lines.entries()) {
		for (const delimiter of delimiters) {
			const cells = splitRow(line, delimiter);
			if (cells.length < 2 || !isHeaderOnly(cells)) continue;
			const isTimed = lines.slice(i + 1).some((below) => shapeOf(splitRow(below, delimiter)).hasMoment);
			const names = cells.map((cell) => meaningOf(cell).quantity);
			// Times below such heads are rows, though none of them holds a figure.
			const code = !isTimed
				? 'header-only'
				: names.includes('temperature')
					? 'no-readings'
					: 'no-temperature';
			return { code, line: null, found: line.slice(0, 80) };
		}
	}
	return { code: 'no-readings', line: null, found: (lines[0] ?? '').trim().slice(0, 80) };
}
