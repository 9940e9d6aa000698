import { describe, expect, it } from 'vitest';
import { rowsAt, valueAt } from './shipment-values';

const values = { seal: 77, lines: [{ lot: 'A', ssccs: ['1', '2'] }, { lot: null }] };

describe('what stands in a form', () => {
	it.each([
		['seal', '77'],
		['lines.0.lot', 'A'],
		['lines.0.ssccs', '1\n2'],
		['lines.1.lot', ''],
		['lines.7.lot', ''],
		['nothing', '']
	])('%s', (path, text) => {
		expect(valueAt(values, path)).toBe(text);
		expect(valueAt(undefined, path)).toBe('');
	});

	it('has as many rows as were sent', () => {
		expect(rowsAt(values, 'lines')).toBe(2);
		expect(rowsAt(values, 'seal')).toBe(0);
		expect(rowsAt(null, 'lines')).toBe(0);
	});
});
