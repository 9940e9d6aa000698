import { describe, expect, it } from 'vitest';
import { listStartingSpecs } from '../domain/starting-specs/list-starting-specs';
import { readSpecForm } from './spec-form';
import { copiedFromText, startingValues } from './spec-form-starting';

describe('a starting spec in the editor', () => {
	it.each(listStartingSpecs().map((starting) => [starting.key, starting] as const))(
		'%s lacks what only the receiver can say, and is whole with it',
		(_, starting) => {
			for (const unit of ['celsius', 'fahrenheit'] as const) {
				const values = startingValues(starting, unit);
				expect(readSpecForm(values).faults).toEqual([
					{ field: 'needed', code: 'missing' },
					{ field: 'openingDefault', code: 'missing' }
				]);
				const { spec, faults } = readSpecForm({ ...values, needed: '1', openingDefault: '0.5' });
				expect(faults).toEqual([]);
				expect(spec).toMatchObject({ neededHours: 24, openingDefaultHours: 12, upper: null, lower: null });
				expect(spec?.sources.map(({ text }) => text)).toEqual(
					starting.figures.sources.map(({ text }) => text)
				);
				expect(spec?.caution).toBe(starting.figures.caution);
			}
		}
	);

	it('says what it was copied from', () => {
		const [first] = listStartingSpecs();
		expect(first && copiedFromText(first)).toContain(first?.product);
	});
});
