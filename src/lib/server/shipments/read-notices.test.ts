import { describe, expect, it } from 'vitest';
import { readNotices } from './read-notices';

const head = ['load', 'supplier', 'due', 'product', 'lot', 'cases'];
const cells = ['W1', 'Olmarisa', '2026-04-03 05:30', 'Blueberries', 'OB-1', '960'];

function fault(text: string): string {
	const found = readNotices(text);
	return found.ok ? '' : found.fault;
}

describe('an advance notice', () => {
	it.each([',', ';', '\t', '|'])('is read whatever its delimiter: %j', (sign) => {
		const found = readNotices(`\uFEFF${head.join(sign)}\r\n${cells.join(sign)}\r\n\r\n`);
		expect(found).toEqual({
			ok: true,
			rows: [
				{
					row: 2,
					cells: {
						...{ load: 'W1', supplier: 'Olmarisa', due: '2026-04-03 05:30', product: 'Blueberries' },
						...{ lot: 'OB-1', cases: '960' }
					}
				}
			]
		});
	});

	it('takes heads in capitals or with underscores, and leaves out columns it does not know', () => {
		const found = readNotices(
			`${head.join(',').toUpperCase()},BEST_BEFORE,colour\n${cells.join(',')},2026-04-18,blue`
		);
		expect(found.ok && found.rows[0]?.cells).toMatchObject({ 'best before': '2026-04-18' });
	});

	it('counts rows as the file does, past quoted line breaks', () => {
		const second = ['W2', '"Two\nlines"', ...cells.slice(2)].join(',');
		const found = readNotices([head.join(','), second, cells.join(',')].join('\n'));
		expect(found.ok && found.rows.map((row) => row.row)).toEqual([3, 4]);
	});

	it('says what keeps it from being read', () => {
		expect(fault('')).toBe('The file is empty.');
		expect(fault('PK\u0003\u0004\0\0')).toContain('no text file');
		expect(fault('load,supplier\nW1,X')).toBe('The head row lacks due, product, lot, cases.');
		expect(fault(head.join(','))).toContain('nothing under it');
		expect(fault(`${head.join(',')},lot\n${cells.join(',')}`)).toContain('twice');
		expect(fault(`${head.join(',')}\nW1,"open`)).toContain('quote');
		const row = `\n${cells.join(',')}`;
		expect(fault(head.join(',') + row.repeat(2001))).toContain('more than 2,000');
	});
});
