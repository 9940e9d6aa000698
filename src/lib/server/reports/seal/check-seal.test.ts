import { PDFDocument } from 'pdf-lib';
import { beforeAll, describe, expect, it } from 'vitest';
import { pdfsig, signatureOf } from '../../../../../tests/helpers/pdf-tools';
import { reportInput } from '../../../../../tests/helpers/report-fixture';
import { sha256Hex } from '../../storage/sha256';
import { reportPdf } from '../pdf/report-pdf';
import { sealedReport } from '../pdf/sealed-report';
import type { ReportInput } from '../pdf/report-input';
import { createCertificate } from './certificate';
import { checkSeal, type SealFault } from './check-seal';

const now = new Date('2026-04-01T00:00:00Z');

/** Adds an incremental revision the way an editor saves one: an object, a table of where it lies, a trailer. */
function withRevision(pdf: Uint8Array): Buffer {
	const text = Buffer.from(pdf).toString('latin1');
	const start = /startxref\s+(\d+)\s+%%EOF\s*$/u.exec(text)?.[1] ?? '0';
	const trailer = /trailer\s*<<([\s\S]*?)>>\s*startxref\s+\d+\s+%%EOF\s*$/u.exec(text)?.[1] ?? '';
	const size = Number(/\/Size (\d+)/u.exec(trailer)?.[1]);
	const object = `${size} 0 obj\n<< /Type /Note /Added true >>\nendobj\n`;
	const table = `xref\n${size} 1\n${String(text.length + 1).padStart(10, '0')} 00000 n \n`;
	const dict = trailer.replace(/\/Size \d+/u, `/Size ${size + 1}`);
	const at = text.length + 1 + object.length;
	return Buffer.from(
		`${text}\n${object}${table}trailer\n<<${dict}/Prev ${start} >>\nstartxref\n${at}\n%%EOF\n`,
		'latin1'
	);
}

describe('the seal of a report, checked by ourselves', () => {
	let made: Awaited<ReturnType<typeof createCertificate>>;
	let sealed: Uint8Array;
	let known: Set<string>;
	const seal = async (input: ReportInput, p12: Uint8Array) =>
		(await sealedReport({ input, p12, passphrase: 'word', timestampUrl: null })).pdf;
	beforeAll(async () => {
		const wanted = { organisation: 'Pell Staithe Fresh', country: 'DE', now, passphrase: 'word' };
		made = await createCertificate(wanted);
		known = new Set([sha256Hex(made.certificateDer)]);
		sealed = await seal(reportInput({}, 1), made.p12);
	});
	const faultOf = (pdf: Uint8Array): SealFault | null => checkSeal(pdf, known).fault;

	it('stands, and names the certificate it was made with', () => {
		expect(checkSeal(sealed, known)).toEqual({
			fault: null,
			certificateSha256: sha256Hex(made.certificateDer),
			timestampAt: null
		});
	});

	it('falls with any one byte that it covers, as pdfsig says too', () => {
		const text = Buffer.from(sealed).toString('latin1');
		const gap = text.indexOf('/Contents <');
		const places = [20, Math.floor(gap / 3), gap - 5, sealed.length - 3];
		for (const at of places) {
			const changed = Uint8Array.from(sealed);
			changed[at] = (changed[at] ?? 0) ^ 1;
			expect(faultOf(changed)).not.toBeNull();
			expect(pdfsig(changed)).not.toContain('Signature is Valid.');
		}
		const middle = Uint8Array.from(sealed);
		middle[1000] = (middle[1000] ?? 0) ^ 1;
		expect(faultOf(middle)).toBe('changed');
	});

	it('falls with any byte of the signature that says something', () => {
		const text = Buffer.from(sealed).toString('latin1');
		const from = text.indexOf('/Contents <') + '/Contents <'.length;
		const length = signatureOf(sealed).cms.length * 2;
		for (let at = from; at < from + length; at += 41) {
			const changed = Uint8Array.from(sealed);
			changed[at] = changed[at] === 0x61 ? 0x62 : 0x61;
			if (changed[at] === sealed[at]) continue;
			expect(faultOf(changed)).not.toBeNull();
		}
	});

	it('falls with a digit in the room left over, or one written as a capital', () => {
		const text = Buffer.from(sealed).toString('latin1');
		const end = text.indexOf('>', text.indexOf('/Contents <'));
		const changed = Uint8Array.from(sealed);
		changed[end - 1] = 0x31;
		expect(faultOf(changed)).toBe('malformed');
		const letter = text.indexOf('a', text.indexOf('/Contents <') + 12);
		const capital = Uint8Array.from(sealed);
		capital[letter] = 0x41;
		expect(faultOf(capital)).toBe('malformed');
	});

	it('tells an appended revision, which pdfsig shows as not wholly signed', () => {
		const revised = withRevision(sealed);
		expect(faultOf(revised)).toBe('appended');
		expect(pdfsig(revised)).toContain('Not total document signed');
		expect(faultOf(Buffer.concat([sealed, Buffer.from('\n')]))).toBe('appended');
	});

	it('tells a signature brought over from another report', async () => {
		const other = await seal(reportInput({ organisation: 'Pell Staithe Other' }, 1), made.p12);
		const hex = signatureOf(sealed).cms.toString('hex');
		const text = Buffer.from(other).toString('latin1');
		const from = text.indexOf('/Contents <') + '/Contents <'.length;
		const transplanted = Buffer.from(text.slice(0, from) + hex + text.slice(from + hex.length), 'latin1');
		expect(faultOf(transplanted)).toBe('changed');
	});

	it('tells a right signature by a stranger of the same name', async () => {
		const wanted = { organisation: 'Pell Staithe Fresh', country: 'DE', now, passphrase: 'word' };
		const stranger = await createCertificate(wanted);
		expect(faultOf(await seal(reportInput({}, 1), stranger.p12))).toBe('other-certificate');
	});

	it('tells a file cut short, one saved again and one never sealed', async () => {
		expect(faultOf(sealed.subarray(0, sealed.length - 10))).toBe('cut-short');
		const saved = await (await PDFDocument.load(sealed)).save();
		expect(faultOf(saved)).not.toBeNull();
		expect(faultOf(await reportPdf(reportInput({}, 1)))).toBe('not-sealed');
		expect(faultOf(new Uint8Array())).toBe('not-sealed');
		expect(faultOf(Buffer.from('/ByteRange [0 1 2 1] <3>'))).not.toBeNull();
		expect(faultOf(Buffer.from('%PDF /ByteRange [0 0 24 0]'))).not.toBeNull();
	});

	it('is not misled by an export or words that speak of ranges', async () => {
		const attachments = [
			{
				name: 'trap.csv',
				bytes: new TextEncoder().encode('/ByteRange [0 1 2 3]\n/Contents <00>\n'.repeat(3)),
				mediaType: 'text/csv',
				description: '/ByteRange [0 1 2 3]',
				relationship: 'Source' as const
			}
		];
		expect(
			faultOf(await seal(reportInput({ attachments, organisation: '/ByteRange [0 1 2 3]' }, 1), made.p12))
		).toBe(null);
	});
});
