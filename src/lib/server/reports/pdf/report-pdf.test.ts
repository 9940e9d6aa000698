import { createHash } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { detached, said, textOf } from '../../../../../tests/helpers/pdf-tools';
import { longReport } from '../../../../../tests/helpers/long-report';
import { reportInput } from '../../../../../tests/helpers/report-fixture';
import type { ReportInput } from './report-input';
import { reportPdf } from './report-pdf';

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

	// Source: 21 CFR 11.50(b): the same on every human-readable form.
	it('says at the foot of every page who signed, what for and when', () => {
		const pages = text.split('\f').filter((page) => page.trim() !== '');
		expect(pages.length).toBeGreaterThanOrEqual(2);
		expect(pages.length).toBeLessThanOrEqual(4);
		for (const page of pages)
			expect(page).toContain('Signed by Ruth Calloway, approval, 3 Apr 2026, 09:44:18 CEST (+02:00).');
	});

	it('prints the reviews and determinations it rests on, each with name, meaning and time', async () => {
		const input = reportInput();
		const signed = { at: '2026-04-03T07:20:05.000Z', zone: 'Europe/Amsterdam', isOfThis: true };
		const reviews = [
			{ id: 'r', by: 'Ivo Sander', byId: 'u', title: 'QA', reasons: 'Trace checked.', ...signed }
		].map((review) => ({ ...review, decisionSha256: 'a'.repeat(64), decision: '[]' }));
		const determinations = [
			{ id: 'd', by: 'Hanneke Pryce', title: '', text: 'Core stayed under the limit.', ...signed }
		];
		const printed = textOf(
			await reportPdf({ ...input, frozen: { ...input.frozen, reviews, determinations } })
		);
		expect(printed).toContain('Signed before');
		expect(printed).toMatch(/Ivo Sander, QA\s+review\s+Trace checked\./u);
		expect(printed).toMatch(/Hanneke Pryce\s+determination\s+Core stayed under the/u);
		expect(printed).toContain('3 Apr 2026, 09:20:05');
	});

	it('holds each pulp reading against the logger of its line at that moment', () => {
		// 0.8 of the pulp, 0.9 of L1 at 08:10, both in the fixture.
		expect(text).toMatch(/line 1, lot .*0\.8 0\.9 −0\.1 L1, in/u);
		expect(text).toContain('return air of the unit 0.9 °C');
	});

	it('says until when each logger is calibrated', () => {
		expect(text.match(/calibration due/gu)).toHaveLength(3);
	});

	it('prints the papers’ count beside what was decided on, where it differs', () => {
		expect(text).toMatch(/\bof 960\b/u);
	});

	it('tells how to check it: is it current, whole, and do the figures stand', () => {
		expect(text).toContain('How to verify this report');
		expect(text).toContain('pellstaithe.example/verify and type 9D4020BE66864093');
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
		expect(text).toMatch(/page 1 of [234]\b/u);
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

	it('is read aloud in the order of the page, each paragraph whole', () => {
		const told = said(pdf, 'pdfinfo', (file) => ['-struct-text', file]).replace(/["\s]+/gu, ' ');
		expect(told).toContain('PS-26-1184');
		expect(told).toMatch(/An estimate of quality.{0,700}contract and local law govern/u);
		expect(told).toContain('Figure');
		expect(told).not.toContain('Syntax Warning');
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
		// Without the counterfoil, whose lines would run into the table's.
		const crop = ['-layout', '-x', '0', '-y', '0', '-W', '468', '-H', '842'];
		const mainColumn = said(pdf, 'pdftotext', (file) => [...crop, file, '-']).replace(/ +/gu, ' ');
		const legs = [
			...mainColumn.matchAll(/^ ?[A-F] .*? (\d+\.\d) (\d+\.\d) (\d+\.\d) (\d+\.\d) (\d+\.\d)(?: .*)?$/gmu)
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

	it('breaks no figure of a long excursion', async () => {
		const { assessments } = reportInput().frozen.docket;
		const hot = assessments.map((one) => ({
			...one,
			excursions: one.excursions.map((excursion) => ({
				...excursion,
				degreeMinutes: 346_971,
				extremeCelsius: -26.1,
				costHours: 159.2
			}))
		}));
		const printed = textOf(await reportPdf(withDocket({ assessments: hot })));
		for (const figure of ['346,971', '−26.1', '159.2']) expect(printed).toContain(figure);
	});

	it('stands on letter paper', async () => {
		const pdf = await reportPdf(reportInput({ pageSize: 'letter' }));
		expect(said(pdf, 'pdfinfo', (file) => [file])).toMatch(/612 x 792/u);
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
		const text = textOf(
			await reportPdf(reportInput({ attachments: [{ ...first, name: 'L1-renamed.csv' }, ...changed] }))
		);
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
		// The lot stands among the dispositions and beside its pulp reading.
		expect(text.match(/X/gu)?.length).toBe(240);
	});
});

describe('a very long load', () => {
	let pdf: Uint8Array;
	let pages: string[];
	beforeAll(async () => {
		pdf = await reportPdf(longReport());
		pages = textOf(pdf)
			.split('\f')
			.filter((page) => page.trim() !== '');
	});

	it('is numbered and signed at the foot of each page', () => {
		for (const [i, page] of pages.entries()) {
			expect(page).toContain(`page ${i + 1} of ${pages.length}`);
			expect(page).toContain('Signed by Ruth Calloway, approval');
		}
	});

	it('repeats title and heads wherever a table goes on', () => {
		for (const [title, head] of [
			['Dispositions', 'Product and lot'],
			['Excursions on other loggers', 'Severity'],
			['Legs, other loggers', 'In whose hands'],
			['Pulp at the door', 'Line and lot']
		] as const) {
			const bearing = pages.filter((page) => page.includes(title));
			expect(bearing.length).toBeGreaterThan(1);
			for (const page of bearing) expect(page).toContain(head);
		}
	});

	it('cuts nothing off: forty lines, sixty excursions, twelve loggers’ legs, thirty pulp readings', () => {
		const text = pages.join('');
		for (let ordinal = 1; ordinal <= 40; ordinal++) {
			expect(text).toContain(`OB-26089-${ordinal}`);
			expect(text).toContain(`Life suffices on line ${ordinal}:`);
		}
		expect(text.match(/minor|major|critical/gu)?.length).toBeGreaterThanOrEqual(60);
		expect(text.match(/All legs/gu)).toHaveLength(12);
		expect(text.match(/in product/gu)?.length).toBeGreaterThanOrEqual(12);
		expect(text).toContain('End of the reasons.');
	});

	it('shows the photographs with the hash of each', () => {
		const images = said(pdf, 'pdfimages', (file) => ['-list', file]);
		expect(images.match(/jpeg/gu)?.length).toBeGreaterThan(0);
		expect(pages.join('')).toContain('Row three, film torn');
	});

	it('says how many notes the house keeps, and not a word of them: the report goes to the supplier', () => {
		const text = pages.join('').replace(/\s+/gu, ' ');
		expect(text).toContain('9 internal notes are kept with the record and not printed here.');
		expect(text).not.toMatch(/Note \d\./u);
	});

	it('lets a remark from the door that is longer than a page go on overleaf', async () => {
		const { arrival } = reportInput({}, 1).frozen.docket;
		if (!arrival) throw new Error('The sample load has no arrival.');
		const conditionNote = `Begin. ${'Film torn at row three. '.repeat(400)}The very end.`;
		const text = textOf(await reportPdf(withDocket({ arrival: { ...arrival, conditionNote } }, 1)));
		expect(text.match(/torn/gu)).toHaveLength(400);
		expect(text.replace(/\s+/gu, ' ')).toContain('very end.');
	});
});

describe('what a person did and what may not be', () => {
	it('prints each trim with its reason, and each stop by itself', async () => {
		const input = reportInput({}, 1);
		const trims = [
			{
				id: 't',
				logger: 'L1',
				fromAt: '2026-04-03T04:00:00.000Z',
				toAt: '2026-04-03T05:10:00.000Z',
				reason: 'lay in the office',
				by: 'R. Calloway'
			}
		];
		const assessments = input.frozen.docket.assessments.map((assessment) => ({
			...assessment,
			stops: [
				{
					kind: 'freezing' as const,
					stopCelsius: -1.3,
					extremeCelsius: -2.1,
					firstAtMs: Date.parse('2026-04-02T22:10:00Z'),
					minutes: 40,
					isInDoubt: false
				}
			]
		}));
		const text = textOf(await reportPdf(withDocket({ trims, assessments }, 1)));
		expect(text).toMatch(/Left out on L1 1:10 h Fri 3 Apr 06:00 to Fri 3 Apr 07:10, by R\. Calloway/u);
		expect(text).toMatch(
			/Freezing stop on L1, line 1: −2\.1 °C against −1\.3 °C, first Fri 3 Apr 00:10, 0:40 in all/u
		);
	});

	it('keeps a long reason of an amendment whole, and short on the counterfoil', async () => {
		const input = reportInput({}, 1);
		const amendmentReason = `${'The buyer takes the second line after all. '.repeat(30)}Done.`;
		const text = textOf(
			await reportPdf({ ...input, signature: { ...input.signature, version: 2, amendmentReason } })
		);
		expect(text).toMatch(/…, whole at/u);
		expect(text.replace(/\s+/gu, ' ')).toMatch(/after all\. Done\./u);
	});
});
