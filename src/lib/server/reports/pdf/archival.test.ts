import { beforeAll, describe, expect, it } from 'vitest';
import { said } from '../../../../../tests/helpers/pdf-tools';
import { longReport } from '../../../../../tests/helpers/long-report';
import { createCertificate } from '../seal/certificate';
import { sealedReport } from './sealed-report';

type Value = null | boolean | number | string | Value[] | { [name: string]: Value };
type Dict = { [name: string]: Value };

/** Every object of the sealed file, as qpdf reads it. */
interface Objects {
	readonly all: readonly Dict[];
	readonly resolve: (value: Value | undefined) => Value | undefined;
	readonly catalog: Dict;
}

const isDict = (value: Value | undefined): value is Dict =>
	typeof value === 'object' && value !== null && !Array.isArray(value);

function objectsOf(pdf: Uint8Array): Objects {
	const told = JSON.parse(said(pdf, 'qpdf', (file) => ['--json=2', '--json-key=qpdf', file])) as {
		qpdf: [Value, { [name: string]: Dict }];
	};
	const table = told.qpdf[1];
	const bodyOf = (entry: Dict | undefined): Value | undefined =>
		isDict(entry?.stream) ? entry.stream.dict : entry?.value;
	const resolve = (value: Value | undefined): Value | undefined =>
		typeof value === 'string' && /^\d+ 0 R$/u.test(value) ? bodyOf(table[`obj:${value}`]) : value;
	const all = Object.values(table).map(bodyOf).filter(isDict);
	const catalog = resolve(isDict(table.trailer?.value) ? table.trailer.value['/Root'] : undefined);
	return { all, resolve, catalog: isDict(catalog) ? catalog : {} };
}

describe('a sealed report kept for the archive', () => {
	let pdf: Uint8Array;
	let objects: Objects;
	beforeAll(async () => {
		const wanted = {
			organisation: 'Pell Staithe',
			country: 'DE',
			now: new Date('2026-04-01T00:00:00Z'),
			passphrase: 'word'
		};
		const { p12 } = await createCertificate(wanted);
		const order = { input: longReport(), p12, passphrase: 'word', timestampUrl: null };
		pdf = (await sealedReport(order)).pdf;
		objects = objectsOf(pdf);
	});
	const dict = (value: Value | undefined): Dict => {
		const found = objects.resolve(value);
		return isDict(found) ? found : {};
	};
	const list = (value: Value | undefined): Value[] => {
		const found = objects.resolve(value);
		return Array.isArray(found) ? found : [];
	};

	// The clauses are those of ISO 19005-3 (PDF/A-3), from memory.
	it('says what it is in XMP that agrees with its own dictionary (6.6.2, 6.6.4)', () => {
		const meta = said(pdf, 'pdfinfo', (file) => ['-meta', file]);
		expect(meta).toMatch(/<pdfaid:part>3<\/pdfaid:part>/u);
		expect(meta).toMatch(/<pdfaid:conformance>[BUA]<\/pdfaid:conformance>/u);
		expect(meta).toContain('Receiving report PS-26-1184, version 1');
		expect(meta).toContain('2026-04-03T07:44:20');
		expect(dict(objects.catalog['/Metadata'])['/Filter']).toBeUndefined();
	});

	it('has one output intent with its sRGB profile inside (6.2.3)', () => {
		const intents = list(objects.catalog['/OutputIntents']).map(dict);
		expect(intents).toHaveLength(1);
		expect(intents[0]?.['/S']).toBe('/GTS_PDFA1');
		expect(dict(intents[0]?.['/DestOutputProfile'])['/N']).toBe(3);
	});

	it('has every font inside, with the letters each glyph stands for (6.2.11)', () => {
		const fonts = objects.all.filter((one) => one['/Type'] === '/Font' && one['/Subtype'] === '/Type0');
		expect(fonts.length).toBeGreaterThan(3);
		for (const font of fonts) {
			expect(font['/ToUnicode']).toBeDefined();
			const [descendant] = list(font['/DescendantFonts']).map(dict);
			const descriptor = dict(descendant?.['/FontDescriptor']);
			expect(descriptor['/FontFile2'] ?? descriptor['/FontFile3']).toBeDefined();
			expect(String(descriptor['/FontName'])).toMatch(/^\/[A-Z]{6}\+/u);
		}
		expect(
			objects.all.filter(
				(one) => one['/Type'] === '/Font' && ['/Type1', '/TrueType'].includes(String(one['/Subtype']))
			)
		).toEqual([]);
	});

	it('names every attached file, says what it is to the report, and hangs it on the document (6.8)', () => {
		const files = objects.all.filter((one) => one['/Type'] === '/Filespec');
		expect(files).toHaveLength(40);
		for (const file of files) {
			expect(file['/F']).toBeDefined();
			expect(file['/UF']).toBeDefined();
			expect(['/Source', '/Data']).toContain(file['/AFRelationship']);
			const stream = dict(dict(file['/EF'])['/F']);
			expect(stream['/Type']).toBe('/EmbeddedFile');
			expect(String(stream['/Subtype'])).toMatch(/^\/\w+/u);
			expect(dict(stream['/Params'])['/ModDate']).toBeDefined();
		}
		expect(list(objects.catalog['/AF'])).toHaveLength(40);
		expect(dict(objects.catalog['/Names'])['/EmbeddedFiles']).toBeDefined();
	});

	it('says its language, shows its title and is tagged (6.7)', () => {
		expect(objects.catalog['/Lang']).toBe('u:en');
		expect(dict(objects.catalog['/ViewerPreferences'])['/DisplayDocTitle']).toBe(true);
		expect(dict(objects.catalog['/MarkInfo'])['/Marked']).toBe(true);
		expect(dict(objects.catalog['/StructTreeRoot'])['/Type']).toBe('/StructTreeRoot');
	});

	it('holds no script, no launch, no encryption, nothing from elsewhere (6.1.3, 6.5, 6.6.1)', () => {
		for (const one of objects.all) {
			expect(one['/JS']).toBeUndefined();
			expect(['/JavaScript', '/Launch', '/Sound', '/Movie', '/ImportData']).not.toContain(one['/S']);
			expect(one['/Encrypt']).toBeUndefined();
		}
		expect(objects.catalog['/AA']).toBeUndefined();
		expect(objects.catalog['/OpenAction']).toBeUndefined();
	});

	it('gives its one field a drawing, prints it, and never asks to draw it anew (6.3, 6.4.1)', () => {
		const widgets = objects.all.filter((one) => one['/Subtype'] === '/Widget');
		expect(widgets).toHaveLength(1);
		expect(Number(widgets[0]?.['/F']) & 0b100).toBe(4);
		expect(dict(widgets[0]?.['/AP'])['/N']).toBeDefined();
		expect(dict(objects.catalog['/AcroForm'])['/NeedAppearances'] ?? false).toBe(false);
	});

	it('is see-through only as the output intent allows, with plain blending and no soft mask (6.2.10)', () => {
		for (const one of objects.all) {
			expect(one['/SMask'] ?? '/None').toBe('/None');
			expect(one['/BM'] ?? '/Normal').toBe('/Normal');
			for (const opacity of ['/ca', '/CA']) {
				expect(one[opacity] ?? 1).toBeGreaterThan(0);
				expect(one[opacity] ?? 1).toBeLessThanOrEqual(1);
			}
		}
	});

	it('packs its streams with nothing but Flate and JPEG (6.1.7.2)', () => {
		const signature = objects.all.filter((one) => one['/Type'] === '/Sig');
		const filters = objects.all
			.filter((one) => !signature.includes(one))
			.flatMap((one) => [one['/Filter'] ?? []].flat());
		expect(filters.length).toBeGreaterThan(10);
		for (const filter of filters) expect(['/FlateDecode', '/DCTDecode']).toContain(filter);
	});

	it('tags words as paragraphs and charts as figures with words in their place; no cell of a table (6.7.3)', () => {
		const elements = objects.all.filter((one) => one['/S'] !== undefined && one['/P'] !== undefined);
		expect([...new Set(elements.map((one) => one['/S']))].sort()).toEqual(['/Document', '/Figure', '/P']);
		expect(elements.length).toBeGreaterThan(500);
		for (const one of elements.filter((element) => element['/S'] === '/Figure'))
			expect(String(one['/Alt']).length).toBeGreaterThan(20);
		const root = dict(objects.catalog['/StructTreeRoot']);
		const [whole] = list(root['/K']).map(dict);
		expect(list(whole?.['/K'])).toHaveLength(elements.length - 1);
		expect(root['/ParentTree']).toBeDefined();
	});

	it('is of one piece, with an identity in its trailer (6.1.3)', () => {
		const text = Buffer.from(pdf).toString('latin1');
		expect(text.slice(0, 8)).toBe('%PDF-1.7');
		expect(text).toMatch(/^%PDF-1\.7\r?\n%[\u0080-\u00ff]{4}/u);
		expect(text.match(/%%EOF/gu)).toHaveLength(1);
		expect(text).toMatch(/\/ID \[\s*<[0-9A-Fa-f]{32}>\s*<[0-9A-Fa-f]{32}>\s*\]/u);
	});
});
