import { describe, expect, it } from 'vitest';
import { stageOf, verdictOf } from './stage';

const at = new Date(0);

describe('the stage of a docket', () => {
	it('follows from the facts, the signed decision first', () => {
		expect(stageOf({ arrivedAt: null, decidedAt: null, isHeld: false })).toBe('expected');
		expect(stageOf({ arrivedAt: at, decidedAt: null, isHeld: false })).toBe('at-the-door');
		expect(stageOf({ arrivedAt: at, decidedAt: null, isHeld: true })).toBe('on-hold');
		expect(stageOf({ arrivedAt: at, decidedAt: at, isHeld: true })).toBe('done');
	});
});

describe('the verdict over all lines', () => {
	it('is part as soon as some goods are refused and others are not', () => {
		expect(verdictOf(['accept', 'conditions', 'reject'])).toBe('part');
		expect(verdictOf(['reject', 'reject'])).toBe('rejected');
		expect(verdictOf(['accept', 'conditions'])).toBe('conditions');
		expect(verdictOf(['accept'])).toBe('accepted');
	});
});
