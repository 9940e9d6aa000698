import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fontFiles } from './fonts';
import { coverageOf } from './glyph-coverage';

const file = fontFiles.Barlow?.normal ?? '';

describe('coverage of a face', () => {
	it('holds the Latin letters with their marks', () => {
		const covered = coverageOf(readFileSync(file));
		for (const character of 'AZaz09 őŁżéß−–°≤') expect(covered.has(character.codePointAt(0) ?? 0)).toBe(true);
	});

	it('lacks what the face does not draw', () => {
		const covered = coverageOf(readFileSync(file));
		for (const character of '青🍎Жα') expect(covered.has(character.codePointAt(0) ?? 0)).toBe(false);
	});

	it('refuses bytes that are no font', () => {
		expect(() => coverageOf(new Uint8Array(64))).toThrow(/no cmap/u);
	});
});
