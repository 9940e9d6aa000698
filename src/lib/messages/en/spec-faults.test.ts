import { describe, expect, it } from 'vitest';
import { specFaultCodes } from '../../domain/shelf-life/spec-fault';
import { fieldName, specFaultSentence, specIssues } from './spec-faults';

describe('the sentence about a fault', () => {
	it('says what is wrong with which figure, and what to enter', () => {
		const values = { lowerGrace: '30', lowerGraceInAll: '20' };
		expect(specFaultSentence({ field: 'lowerGraceInAll', code: 'grace-in-all-short' }, values)).toBe(
			'Lower limit: 20 minutes in all is less than the 30 allowed for one event. Enter 30 or more.'
		);
		expect(
			specFaultSentence({ field: 'needed', code: 'more-than-full-life' }, { needed: '29', fullLife: '28' })
		).toBe('Life needed: 29 days is more than the full life of 28. Enter 28 or fewer.');
		expect(
			specFaultSentence(
				{ field: 'upperCritical', code: 'severity-upside-down' },
				{ upperCritical: '1:00', upperMajor: '2:00' }
			)
		).toBe('Upper limit: critical from 1:00 comes before major from 2:00. Enter that or later.');
	});

	it('exists for every fault the figures can have, and ends with what to do', () => {
		for (const code of specFaultCodes) {
			const sentence = specFaultSentence({ field: 'freezing', code }, { freezing: '9', ceiling: '7' });
			expect(sentence).toMatch(/^Freezing stop: .+\. [A-Z].+\.$/);
		}
	});

	it('names rows as the table numbers them', () => {
		expect(['point0Life', 'band1Q10', 'source2Text', 'tmin'].map(fieldName)).toEqual([
			'Point 1',
			'Band 2',
			'Source 3',
			'Tmin'
		]);
	});

	it('is the first one where a field has several', () => {
		const faults = [
			{ field: 'q10', code: 'missing' },
			{ field: 'q10', code: 'not-a-number' }
		] as const;
		expect(specIssues(faults, {})).toEqual({ q10: 'Q10: nothing is entered. Enter a figure.' });
	});
});
