import { describe, expect, it } from 'vitest';
import { sortFiles } from './file-choice';

const small = new File(['a;b\n1;2\n'], 'trip.csv');
const empty = new File([], 'empty.csv');
const large = new File(['x'.repeat(50)], 'large.csv');

describe('choosing files', () => {
	it('takes what fits and says why the rest does not', () => {
		expect(sortFiles([small, empty, large], 20, true)).toEqual({
			taken: [small],
			refused: [
				{ file: empty, reason: 'empty' },
				{ file: large, reason: 'too-large' }
			]
		});
	});

	it('takes only the first where one is asked for', () => {
		expect(sortFiles([small, large], 100, false).taken).toEqual([small]);
	});

	it('takes a file of exactly the limit', () => {
		expect(sortFiles([large], 50, true).taken).toEqual([large]);
	});
});
