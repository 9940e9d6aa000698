// @vitest-environment node
import { describe, expect, it } from 'vitest';
import { cutByMarks, cutBySubject } from './marked-text';

const marked = (pieces: { text: string; isMarked: boolean }[]) =>
	pieces.map(({ text, isMarked }) => (isMarked ? `[${text}]` : text)).join('');

describe('a row with its ambiguous part marked', () => {
	it.each([
		['03/04/2026;1,4', [{ from: 0, to: 5 }], '[03/04]/2026;1,4'],
		['a;03/04', [{ from: 2, to: 7 }], 'a;[03/04]'],
		[
			'1 2 3',
			[
				{ from: 4, to: 5 },
				{ from: 0, to: 1 }
			],
			'[1] 2 [3]'
		],
		['short', [{ from: 3, to: 99 }], 'sho[rt]'],
		['short', [{ from: 9, to: 12 }], 'short'],
		['', [], '']
	])('cuts %j', (text, marks, expected) => {
		expect(marked(cutByMarks(text, marks))).toBe(expected);
	});

	it('marks the subject where the question names it', () => {
		expect(marked(cutBySubject('Is 03/04 the 3rd of April?', '03/04'))).toBe('Is [03/04] the 3rd of April?');
		expect(marked(cutBySubject('Which time zone?', ''))).toBe('Which time zone?');
	});
});
