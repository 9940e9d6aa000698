import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { afterAll, describe, expect, it } from 'vitest';
import { cut, multipart } from '../../../../tests/helpers/upload';
import { sha256Hex } from '../storage/sha256';
import { safeFileName, spoolUpload } from './spool-upload';

const folder = mkdtempSync(join(tmpdir(), 'wharfinger-spool-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));
const limits = { folder, maxBytes: 1000, maxFiles: 20 };

describe('an upload on its way to disk', () => {
	it('keeps every byte and hashes them on the way', async () => {
		const content = Buffer.from(Array.from({ length: 999 }, (_, i) => i % 256));
		const { body, contentType } = await multipart([{ name: 'a.csv', content }]);
		const { files, clear } = await spoolUpload(body, contentType, limits);
		expect(files).toMatchObject([
			{ fileName: 'a.csv', bytes: 999, sha256: sha256Hex(content), isTooLarge: false }
		]);
		expect(readFileSync(files[0]?.path ?? '')).toEqual(content);
		await clear();
		expect(readdirSync(folder)).toEqual([]);
	});

	it.each(['fields-first', 'files-first'] as const)(
		'takes fields and files in any order: %s',
		async (order) => {
			const sent = [
				{ name: 'a.csv', content: 'a' },
				{ name: 'b.csv', content: 'b' }
			];
			const { body, contentType } = await multipart(sent, { id: 'one' }, order);
			const { files, fields, clear } = await spoolUpload(body, contentType, limits);
			expect(files.map(({ fileName }) => fileName)).toEqual(['a.csv', 'b.csv']);
			expect(fields.get('id')).toEqual(['one']);
			await clear();
		}
	);

	it('takes a file of just the limit, and marks one byte more', async () => {
		const { body, contentType } = await multipart([
			{ name: 'just.csv', content: 'x'.repeat(1000) },
			{ name: 'over.csv', content: 'x'.repeat(1001) }
		]);
		const { files, clear } = await spoolUpload(body, contentType, limits);
		expect(files.map(({ isTooLarge }) => isTooLarge)).toEqual([false, true]);
		await clear();
	});

	it('refuses an upload that broke off, and leaves nothing behind', async () => {
		const { bytes, contentType } = await multipart([{ name: 'a.csv', content: 'x'.repeat(900) }]);
		const half = Readable.from(cut(bytes.subarray(0, 500), 100));
		await expect(spoolUpload(half, contentType, limits)).rejects.toMatchObject({ code: 'upload-broken' });
		expect(readdirSync(folder)).toEqual([]);
	});

	it('refuses likewise when the line itself fails in the middle of a file', async () => {
		const { bytes, contentType } = await multipart([{ name: 'a.csv', content: 'x'.repeat(900) }]);
		async function* failing() {
			yield bytes.subarray(0, 400);
			throw new Error('socket hang up');
		}
		await expect(spoolUpload(Readable.from(failing()), contentType, limits)).rejects.toMatchObject({
			code: 'upload-broken'
		});
		expect(readdirSync(folder)).toEqual([]);
	});

	it('says that a larger body than the server takes is too large', async () => {
		const tooMuch = Object.assign(new Error('Content-length exceeds the limit'), { status: 413 });
		async function* refused(): AsyncGenerator<Buffer> {
			yield Buffer.from('--x\r\n');
			throw tooMuch;
		}
		await expect(
			spoolUpload(Readable.from(refused()), 'multipart/form-data; boundary=x', limits)
		).rejects.toMatchObject({ code: 'too-large' });
	});

	it.each([null, 'application/json', 'multipart/form-data'])(
		'refuses a body of the type %s',
		async (type) => {
			await expect(spoolUpload(Readable.from(['x']), type, limits)).rejects.toMatchObject({
				code: 'not-multipart'
			});
			expect(readdirSync(folder)).toEqual([]);
		}
	);

	it('finds no file in a form that was sent without choosing one', async () => {
		const { body, contentType } = await multipart([
			{ name: '', content: '', type: 'application/octet-stream' }
		]);
		const { files, clear } = await spoolUpload(body, contentType, limits);
		expect(files).toEqual([]);
		await clear();
	});

	it.each([
		['../../etc/passwd', 'passwd'],
		['C:\\loads\\trip.csv', 'trip.csv'],
		['évaluation 3.csv', 'évaluation 3.csv'],
		['a\u0000b\u202e.csv', 'ab.csv'],
		['', 'export'],
		[undefined, 'export']
	])('shows the name %j as %j', (given, shown) => {
		expect(safeFileName(given)).toBe(shown);
	});
});
