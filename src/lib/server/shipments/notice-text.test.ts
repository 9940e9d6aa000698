import { describe, expect, it } from 'vitest';
import { maxImportBytes } from '../../schemas/import';
import { noticeText } from './notice-text';

function sent(file: File | string | null, headers: Record<string, string> = {}): Request {
	const body = new FormData();
	if (file !== null) body.set('file', file);
	return new Request('http://localhost/', { method: 'POST', body, headers });
}

describe('an uploaded sheet', () => {
	it('is read as UTF-8, else as a Western Windows sheet', async () => {
		const utf8 = await noticeText(sent(new File(['lot;Müller'], 'a.csv')));
		expect(utf8).toEqual({ name: 'a.csv', text: 'lot;Müller' });
		const windows = await noticeText(sent(new File([Uint8Array.from([0x4d, 0xfc])], 'b.csv')));
		expect(windows.text).toBe('Mü');
	});

	it('is asked for when it is missing and refused when it is too large', async () => {
		await expect(noticeText(sent(null))).rejects.toMatchObject({ code: 'not-multipart' });
		await expect(noticeText(sent('text'))).rejects.toMatchObject({ code: 'not-multipart' });
		const large = new File([new Uint8Array(maxImportBytes + 1)], 'c.csv');
		await expect(noticeText(sent(large))).rejects.toMatchObject({ code: 'too-large' });
		const told = sent(null, { 'content-length': String(maxImportBytes * 2) });
		await expect(noticeText(told)).rejects.toMatchObject({ code: 'too-large' });
	});
});
