import { describe, expect, it } from 'vitest';
import { cleanJpeg } from './clean-jpeg';
import { exifSegment, samplePhoto, withSegment } from './sample-photo';

const text = (bytes: Uint8Array | null) => Buffer.from(bytes ?? []).toString('latin1');

describe('a photograph', () => {
	it('stays as it is when nothing but the picture is in it', () => {
		expect(cleanJpeg(samplePhoto)).toEqual(samplePhoto);
	});

	it('loses what the camera wrote about itself and its place', () => {
		const withPlace = withSegment(samplePhoto, exifSegment('GPS 52.1 N'));
		expect(text(withPlace)).toContain('GPS');
		expect(cleanJpeg(withPlace)).toEqual(samplePhoto);
	});

	it('loses comments and anything behind its end', () => {
		const note = Uint8Array.from([0xff, 0xfe, 0, 4, 0x68, 0x69]);
		const longer = Buffer.concat([withSegment(samplePhoto, note), Buffer.from('<script>')]);
		expect(cleanJpeg(longer)).toEqual(samplePhoto);
	});

	it('is no photograph when it is cut short, anywhere', () => {
		for (let end = 0; end < samplePhoto.length; end++)
			expect(cleanJpeg(samplePhoto.subarray(0, end))).toBeNull();
	});

	it.each([
		['a PNG', [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]],
		['a drawing in SVG', [...Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>')]],
		['a start without a picture', [0xff, 0xd8, 0xff, 0xd9]],
		['nothing', []]
	])('is not %s', (_, bytes) => {
		expect(cleanJpeg(Uint8Array.from(bytes))).toBeNull();
	});
});
