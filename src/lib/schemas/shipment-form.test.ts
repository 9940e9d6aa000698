import { describe, expect, it } from 'vitest';
import { shipmentInput } from './shipment-form';

const productId = '018f0000-0000-7000-8000-000000000001';
const supplierId = '018f0000-0000-7000-8000-000000000002';
const line = { productId, lot: 'OB-1', cases: '960' };
const papers = { supplierId, due: '2026-04-03T09:30', lines: [line] };

function issueAt(input: unknown, path: string): string | undefined {
	const parsed = shipmentInput.safeParse(input);
	return parsed.error?.issues.find((issue) => issue.path.join('.') === path)?.message;
}

describe('the papers of a load', () => {
	it('need a supplier, a due time and one line, and nothing else', () => {
		const parsed = shipmentInput.parse(papers);
		expect(parsed.lines).toHaveLength(1);
		expect(parsed.lines[0]).toMatchObject({ at: 0, cases: 960, gtin: null, ssccs: [], value: null });
		expect(parsed).toMatchObject({ mode: 'road', carrierId: null, handovers: [], loggers: [] });
	});

	it('say beside each field what is missing', () => {
		expect(issueAt({}, 'supplierId')).toBe('Choose the supplier.');
		expect(issueAt({ ...papers, due: '' }, 'due')).toBe('When is it due?');
		expect(issueAt({ ...papers, lines: [] }, 'lines')).toContain('at least one line');
		expect(issueAt({ ...papers, lines: [{ productId, lot: '', cases: '1' }] }, 'lines.0.lot')).toContain(
			'lot'
		);
		expect(issueAt({ ...papers, lines: [{ ...line, cases: '' }] }, 'lines.0.cases')).toContain('How many');
	});

	it('leave out empty rows and still name a faulty row by the place it stands at', () => {
		const empty = { productId: '', lot: ' ', cases: '', currency: 'EUR', openingKind: 'undeclared' };
		const rows = [empty, line, { ...line, cases: 'many' }];
		expect(issueAt({ ...papers, lines: rows }, 'lines.2.cases')).toContain('number');
		const parsed = shipmentInput.parse({ ...papers, lines: [empty, line] });
		expect(parsed.lines.map((row) => row.at)).toEqual([1]);
	});

	it('take numbers with a decimal comma or a true minus', () => {
		const parsed = shipmentInput.parse({
			...papers,
			handovers: [{ holder: 'Packhouse', setPointCelsius: '−0,5' }]
		});
		expect(parsed.handovers[0]?.setPointCelsius).toBe(-0.5);
	});

	it('keep a GTIN as fourteen digits and refuse a wrong check digit', () => {
		// 9506000134352: the example GTIN of the GS1 Digital Link standard.
		const good = shipmentInput.parse({ ...papers, lines: [{ ...line, gtin: '950 6000 134352' }] });
		expect(good.lines[0]?.gtin).toBe('09506000134352');
		expect(issueAt({ ...papers, lines: [{ ...line, gtin: '9506000134353' }] }, 'lines.0.gtin')).toContain(
			'check digit'
		);
		expect(issueAt({ ...papers, lines: [{ ...line, gtin: '12345' }] }, 'lines.0.gtin')).toContain('digits');
	});

	it('take SSCCs one a line, with or without their identifier, and none twice', () => {
		// urn:epc:id:sscc:0614141.1234567890, the SSCC example of the GS1 EPC Tag Data Standard.
		const sscc = '106141412345678908';
		const parsed = shipmentInput.parse({ ...papers, lines: [{ ...line, ssccs: `(00)${sscc}\n` }] });
		expect(parsed.lines[0]?.ssccs).toEqual([sscc]);
		expect(
			issueAt({ ...papers, lines: [{ ...line, ssccs: `${sscc}, 00${sscc}` }] }, 'lines.0.ssccs')
		).toContain('twice');
		expect(issueAt({ ...papers, lines: [{ ...line, ssccs: '123' }] }, 'lines.0.ssccs')).toContain('123');
	});

	it('ask a declared balance for its hours and a worked-out one for its start', () => {
		expect(
			issueAt({ ...papers, lines: [{ ...line, openingKind: 'declared' }] }, 'lines.0.openingHours')
		).toBeDefined();
		expect(
			issueAt({ ...papers, lines: [{ ...line, openingKind: 'computed' }] }, 'lines.0.openingSince')
		).toBeDefined();
	});
});
