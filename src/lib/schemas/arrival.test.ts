import { describe, expect, it } from 'vitest';
import { arrivalInput, doubtfulUnit } from './arrival';

const seen = { arrived: '2026-04-03T09:22', seal: 'as-on-papers' };

function issueAt(input: unknown, path: string): string | undefined {
	const parsed = arrivalInput.safeParse(input);
	return parsed.error?.issues.find((issue) => issue.path.join('.') === path)?.message;
}

describe('what was seen at the door', () => {
	it('needs a time and how the seal was, and nothing else', () => {
		expect(arrivalInput.parse(seen)).toMatchObject({ counts: [], pulp: [], driverName: null });
		expect(issueAt({ seal: 'broken' }, 'arrived')).toBe('When did it arrive?');
		expect(issueAt({ arrived: seen.arrived }, 'seal')).toBe('How was the seal?');
	});

	it('asks for the number of another seal', () => {
		expect(issueAt({ ...seen, seal: 'other' }, 'sealFound')).toContain('number');
		expect(issueAt({ ...seen, seal: 'other', sealFound: '77' }, 'sealFound')).toBeUndefined();
	});

	it('asks about a pulp figure that only makes sense in the other unit, until it is meant', () => {
		const warm = { position: 'nose', degrees: '34', unit: 'celsius' };
		expect(issueAt({ ...seen, pulp: [warm] }, 'pulp.0.degrees')).toContain('Did you mean °F?');
		expect(issueAt({ ...seen, pulp: [{ ...warm, unit: 'fahrenheit' }] }, 'pulp.0.degrees')).toBeUndefined();
		const meant = arrivalInput.parse({ ...seen, pulp: [{ ...warm, isMeant: 'on' }] });
		expect(meant.pulp[0]?.degrees).toBe(34);
	});

	it('leaves out pulp rows in which only the unit is chosen', () => {
		expect(arrivalInput.parse({ ...seen, pulp: [{ unit: 'celsius', degrees: '' }] }).pulp).toEqual([]);
		expect(issueAt({ ...seen, pulp: [{ position: 'nose', degrees: '' }] }, 'pulp.0.degrees')).toContain(
			'probe'
		);
	});

	it.each([
		[34, 'celsius', true],
		[1.6, 'celsius', false],
		[-18, 'celsius', false],
		[34, 'fahrenheit', false],
		[1.6, 'fahrenheit', true],
		[-0.4, 'fahrenheit', false]
	] as const)('%s in %s is doubtful: %s', (degrees, unit, isDoubtful) => {
		expect(doubtfulUnit(degrees, unit) !== null).toBe(isDoubtful);
	});
});
