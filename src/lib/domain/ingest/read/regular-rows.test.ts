import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decodeBytes } from '../decode/decode-bytes';
import { tableFromText } from '../delimited/table-from-text';
import { profileColumns } from '../layout/columns';
import type { Table } from '../layout/table';
import { findTiming } from '../layout/timing';
import { gather, gatherValues } from './gather';
import { regularRowsOf } from './regular-rows';

const folder = 'sample-uploads';
const samples = readdirSync(folder, { withFileTypes: true })
	.filter((entry) => entry.isFile() && entry.name !== 'README.md')
	.map(({ name }) => {
		const decoded = decodeBytes(readFileSync(join(folder, name)));
		return { name, text: 'text' in decoded ? decoded.text : '' };
	});

function tableOf(text: string): Table | null {
	const table = tableFromText(text);
	return 'rowCount' in table ? table : null;
}

/** All that a pass over the rows gives, with regular rows read in place or every row split. */
function gathered(table: Table, isInPlace: boolean) {
	const columns = profileColumns(table);
	const indexes = columns.map(({ index }) => index);
	const read = isInPlace ? table : { ...table, rowText: null };
	const all = gather(read, findTiming(columns), indexes, []);
	return { all, later: gatherValues(read, all, indexes) };
}

/** How many rows are read in place once the first has been read in full. */
function inPlace(text: string): number {
	const table = tableOf(text);
	if (table === null) return -1;
	let read = 0;
	const regular = regularRowsOf(table, null, [0]);
	for (let row = 0; row < table.rowCount; row++) if (regular?.read(row, null) === true) read++;
	return read;
}

describe('regular rows', () => {
	it.each(samples)('of $name hold what splitting every row gives', ({ text }) => {
		const table = tableOf(text);
		if (table !== null) expect(gathered(table, true)).toEqual(gathered(table, false));
	});

	it('of damaged files hold what splitting every row gives', () => {
		const pieces = fc.array(
			fc.constantFrom(
				'2026-04-01 10:00',
				'2026-04-01 10:10:00',
				'02.04.2026 9:05',
				'1775037600',
				'10:20',
				';',
				';',
				',',
				'4.5',
				'-4,25',
				'"4.5"',
				'n/a',
				' ',
				'\n',
				'\n',
				'"',
				'4.5 °C',
				'AM'
			),
			{ minLength: 3, maxLength: 60 }
		);
		let compared = 0;
		fc.assert(
			fc.property(pieces, (parts) => {
				const rows = '2026-04-01 09:40;4.4\n2026-04-01 09:50;4.5\n2026-04-01 10:00;4.6\n';
				const table = tableOf(`time;temperature °C\n${rows}${parts.join('')}\n${rows}`);
				if (table === null) return;
				compared++;
				expect(gathered(table, true)).toEqual(gathered(table, false));
			}),
			{ numRuns: 2000, seed: 14 }
		);
		expect(compared).toBeGreaterThan(1000);
	});

	it('are read in place where rows are alike, and only there', () => {
		const rows = Array.from({ length: 50 }, (_, i) => `4.${i % 10};${new Date(i * 6e5).toISOString()}`);
		expect(inPlace(`t °C;time\n${rows.join('\n')}\n`)).toBe(50);
		expect(inPlace(`t;time\n${rows.map((row) => row.replace(';', ' °C;')).join('\n')}\n`)).toBe(0);
	});

	it('need one character between the cells', () => {
		const table = tableOf('2026-04-01 10:00   4.5\n2026-04-01 10:10   4.6\n2026-04-01 10:20   4.7\n');
		expect(table === null ? null : regularRowsOf(table, null, [0])).toBeNull();
	});
});
