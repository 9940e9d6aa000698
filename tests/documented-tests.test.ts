import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const root = join(import.meta.dirname, '..');
const guide = readFileSync(join(root, 'DEVELOPERS.md'), 'utf8');

/** The rows of the tables that go through the paragraphs: what is asked in the second cell, what shows it in the last. */
const rows = guide
	.split('\n')
	.filter((line) => /^\| \d/.test(line) && !line.startsWith('| 21 CFR'))
	.map((line) => line.split('|').map((cell) => cell.trim()))
	.map(([, paragraph = '', asked = '', shown = '']) => ({ paragraph, asked, shown }));

/** Each file a text names, with the sentences quoted behind it, up to the next file. */
function namedIn(text: string): { file: string; sentences: string[] }[] {
	return [...text.matchAll(/`([^`]+\.test\.ts)`([^`]*)/g)].map(([, file = '', behind = '']) => ({
		file: file.startsWith('tests/') ? file : `src/lib/${file}`,
		sentences: [...behind.matchAll(/"([^"]+)"/g)].map(([, sentence = '']) => sentence)
	}));
}

describe('the table of rules for records', () => {
	it('goes through every paragraph of Part 11 subparts B and C, and of Annex 11', () => {
		const said = rows.map(({ paragraph }) => paragraph);
		// 21 CFR 11.10(a) to (k), 11.30 to 11.300; EU GMP Annex 11 (2011), 1 to 17.
		for (const letter of 'abcdefghijk') expect(said).toContain(`11.10(${letter})`);
		for (const section of ['11.30', '11.50', '11.70', '11.100', '11.200', '11.300'])
			expect(said.some((one) => one.startsWith(section))).toBe(true);
		const ofAnnex = said.filter((one) => !one.startsWith('11.1') || one === '11').join(' ');
		for (let number = 5; number <= 17; number++)
			expect(ofAnnex).toMatch(new RegExp(`(^| )${number}( |\\.|$)`));
		expect(said).toContain('1–4');
	});

	it.each(rows)('$paragraph names a test by its sentence, or says that it is procedure', ({ shown }) => {
		const named = namedIn(shown);
		const isByProcedure = shown.includes('by procedure, not software') || shown === 'none are used';
		expect(isByProcedure || named.length > 0).toBe(true);
		for (const { file, sentences } of named) expect([file, sentences.length > 0]).toEqual([file, true]);
	});

	it.each(namedIn(guide).filter(({ sentences }) => sentences.length > 0))(
		'$file is there, and says $sentences',
		({ file, sentences }) => {
			expect(existsSync(join(root, file)), file).toBe(true);
			const source = readFileSync(join(root, file), 'utf8');
			for (const sentence of sentences) expect(source).toContain(sentence);
		}
	);
});
