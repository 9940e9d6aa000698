import { createHash } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { detached, said, textOf } from '../../../../../tests/helpers/pdf-tools';
import { reportInput } from '../../../../../tests/helpers/report-fixture';
import type { ReportInput } from './report-input';
import { reportPdf } from './report-pdf';

const drawnFrom = async (overrides: Partial<ReportInput>, lines?: number) =>
	textOf(await reportPdf(reportInput(overrides, lines)));

/** The input with a changed docket. */
function withDocket(change: Partial<ReportInput['frozen']['docket']>, lines?: number): ReportInput {
	const input = reportInput({}, lines);
	return { ...input, frozen: { ...input.frozen, docket: { ...input.frozen.docket, ...change } } };
}

describe('the receiving report on paper', () => {
	let pdf: Uint8Array;
	let text: string;
	beforeAll(async () => {
		pdf = await reportPdf(reportInput());
		text = textOf(pdf);
	});

	it('is the same bytes from the same input', async () => {
		expect(Buffer.from(await reportPdf(reportInput())).equals(Buffer.from(pdf))).toBe(true);
	});

	// Source: 21 CFR 11.50(a): printed name, date and time, meaning.
	it('prints who signed, the meaning, and the date and time with the zone', () => {
		expect(text).toContain('Ruth Calloway');
		expect(text).toContain('Approval');
		expect(text).toContain('3 Apr 2026, 09:44:18');
		expect(text).toContain('CEST, +02:00');
	});

	it('prints every line with its life, low to high, and its outcome', () => {
		expect(text).toMatch(/12\.4.*11\.0.*Accept/u);
		expect(text).toContain('12.0–12.8');
		expect(text).toMatch(/10\.1.*11\.0.*Reject/u);
		expect(text).toContain('Short, on the low');
	});

	it('says when life ends about, and never that it should be used by a day', () => {
		expect(text).toContain('Life ends about');
		expect(text).not.toMatch(/use by/iu);
	});

	it('prints whole hashes, of the record and of each export', () => {
		const whole = text.replace(/\s/gu, '');
		const { frozen, signature } = reportInput();
		for (const hash of [
			signature.frozenSha256,
			...frozen.docket.loggers.map((logger) => logger.fileSha256 ?? '?')
		]) {
			for (const group of hash.match(/.{8}/gu) ?? []) expect(whole).toContain(group);
		}
	});

	it('carries the raw exports byte for byte', () => {
		const { attachments } = reportInput();
		const files = detached(
			pdf,
			attachments.map((attachment) => attachment.name)
		);
		const digest = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
		for (const attachment of attachments) {
			expect(digest(files.get(attachment.name) ?? Buffer.alloc(0))).toBe(digest(attachment.bytes));
		}
	});

	it('prints the caution, site number, page count and the address to check', () => {
		expect(text).toContain('never overrides a food-safety limit');
		expect(text).toContain('GLN 9506000050010');
		expect(text).toContain('page 1 of 4');
		expect(text.replace(/\s/gu, '')).toContain('9D4020BE66864093');
	});

	it('is titled, in a language, tagged, of PDF 1.7 and marked PDF/A-3b', () => {
		const info = said(pdf, 'pdfinfo', (file) => [file]);
		expect(info).toContain('Receiving report PS-26-1184, version 1');
		expect(info).toMatch(/Tagged:\s+yes/u);
		expect(info).toMatch(/PDF version:\s+1\.7/u);
		const meta = said(pdf, 'pdfinfo', (file) => ['-meta', file]);
		expect(meta).toMatch(/pdfaid:part>3</u);
		expect(meta).toMatch(/pdfaid:conformance>B</u);
		expect(said(pdf, 'qpdf', (file) => ['--check', file])).toContain('No syntax or stream encoding errors');
	});

	it('embeds every face it uses', () => {
		const fonts = said(pdf, 'pdffonts', (file) => [file])
			.split('\n')
			.slice(2)
			.filter(Boolean);
		expect(fonts.length).toBeGreaterThan(3);
		for (const font of fonts) expect(font).toMatch(/yes yes yes/u);
	});

	it('prints rows that add up to the printed totals', () => {
		const legs = [
			...text.matchAll(/^ ?[A-F] .*? (\d+\.\d) (\d+\.\d) (\d+\.\d) (\d+\.\d) (\d+\.\d) ?$/gmu)
		].slice(0, 6);
		expect(legs).toHaveLength(6);
		for (const [, allowed, used, over, warm, late] of legs) {
			expect(Number(warm) + Number(late)).toBeCloseTo(Number(over), 6);
			expect(Number(allowed) + Number(over)).toBeCloseTo(Number(used), 6);
		}
	});
});

describe('other loads', () => {
	it('prints temperatures in the site’s unit', async () => {
		const site = {
			...reportInput().frozen.docket.site,
			temperatureUnit: 'fahrenheit' as const,
			zone: 'America/New_York'
		};
		const text = textOf(await reportPdf({ ...withDocket({ site }), reasonTexts: {} }));
		expect(text).toContain('52.3');
		expect(text).toContain('°F');
		expect(text).not.toMatch(/limits 4\.0|11\.3 °C/u);
		expect(text).toContain('03:44:18 EDT');
	});

	it('stands on letter paper', async () => {
		const pdf = await reportPdf(reportInput({ pageSize: 'letter' }));
		expect(said(pdf, 'pdfinfo', (file) => [file])).toMatch(/612 x 792/u);
	});

	it('cuts nothing off a load of forty lines', async () => {
		const text = await drawnFrom({}, 40);
		for (let ordinal = 1; ordinal <= 40; ordinal++) {
			expect(text).toContain(`OB-26089-${ordinal}`);
			expect(text).toContain(`Excursions on L${ordinal}`);
		}
	});

	it('says that life is not known where no logger rode', async () => {
		const lines = reportInput({}, 1).frozen.docket.lines.map((line) => ({ ...line, remainingHours: null }));
		const text = textOf(
			await reportPdf(
				withDocket({ lines, assessments: [], loggers: [], pulp: [], photos: [], arrival: null }, 1)
			)
		);
		expect(text).toContain('Not known');
		expect(text).toContain('not known');
	});

	it('prints names as written, in whatever letters, and breaks out of nothing', async () => {
		const names = ['Őrségi <script>alert(1)</script> & "Gyümölcs"', 'Овощная база', 'Φρούτα Αττικής'];
		const input = reportInput();
		const assessments = input.frozen.docket.assessments.map((assessment) => ({
			...assessment,
			legs: assessment.legs.map((leg, i) => ({
				...leg,
				holder: names[i % 3] ?? '',
				place: '</text><image href="file:///etc/passwd"/>'
			}))
		}));
		const text = textOf(await reportPdf(withDocket({ assessments })));
		expect(text).toContain('Őrségi');
		expect(text).toContain('<script>');
		expect(text).toContain('Овощная');
		expect(text).toContain('Φρούτα');
	});

	it('marks letters that no face has, and never fails on them', async () => {
		const supplier = { ...reportInput().frozen.docket.supplier, name: '青森りんご 🍎 Growers' };
		const text = textOf(await reportPdf(withDocket({ supplier })));
		expect(text).toContain('Growers');
	});

	it('finds an export among the attached files by its bytes, whatever its name', async () => {
		const [first, ...others] = reportInput().attachments;
		if (first === undefined) throw new Error('the fixture has attachments');
		const changed = others.map((other) => ({ ...other, bytes: new Uint8Array([1]) }));
		const text = await drawnFrom({ attachments: [{ ...first, name: 'L1-renamed.csv' }, ...changed] });
		expect(text).toContain('L1-renamed.csv, attached inside');
		expect(text).toContain('SB-30412.csv, kept, not attached');
	});

	it('keeps two exports of one name apart, and an empty one', async () => {
		const [first] = reportInput().attachments;
		if (first === undefined) throw new Error('the fixture has attachments');
		const twice = { ...first, name: 'a/../trip.csv' };
		const pdf = await reportPdf(reportInput({ attachments: [twice, { ...twice, bytes: new Uint8Array() }] }));
		const list = said(pdf, 'pdfdetach', (file) => ['-list', file]);
		expect(list).toContain('a_.._trip.csv');
		expect(list).toContain('a_.._trip (2).csv');
	});

	it('breaks a word longer than its column', async () => {
		const lines = reportInput({}, 1).frozen.docket.lines.map((line) => ({
			...line,
			lot: 'X'.repeat(120),
			product: 'Y'.repeat(90)
		}));
		const text = textOf(await reportPdf(withDocket({ lines }, 1))).replace(/\s/gu, '');
		expect(text.match(/X/gu)?.length).toBe(120);
	});
});
