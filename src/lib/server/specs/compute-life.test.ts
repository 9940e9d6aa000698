import { describe, expect, it } from 'vitest';
import { roles, systemContext, type Role } from '../context';
import { Refusal } from '../refusals';
import { parseBoundedJson } from './bounded-json';
import { computeForCaller, computeLifeOf } from './compute-life';

const model = { kind: 'squareRoot', minCelsius: -10, referenceCelsius: 0, lifeHours: 336 };
const question = {
	model,
	readings: [
		[0, 0],
		[86_400, 0]
	]
};

function callerWith(role: Role) {
	const system = systemContext(new Date('2026-04-03T06:00:00Z'));
	return { ...system, actor: { ...system.actor, roles: [role] } };
}
const codeOf = (work: () => unknown): string => {
	try {
		work();
	} catch (refusal) {
		if (refusal instanceof Refusal) return refusal.code;
		throw refusal;
	}
	return 'none';
};

describe('life computed for a caller', () => {
	it.each(roles)('of role %s', (role) => {
		const code = codeOf(() => computeForCaller(callerWith(role), JSON.stringify(question)));
		expect(code).toBe(role === 'supplier' ? 'not-allowed' : 'none');
	});

	it('is what the file gives without one', () => {
		const answer = computeForCaller(callerWith('qa'), JSON.stringify(question));
		expect(answer).toEqual(computeLifeOf(question));
		expect(answer.usedFraction).toBeCloseTo(24 / 336, 14);
	});

	it('takes a million readings, and not one more', () => {
		const readings = Array.from({ length: 1_000_000 }, (_, i) => [i * 60, (i % 80) / 10]);
		const { usedFractionAtReading, meanCelsius } = computeLifeOf({ model, readings });
		expect(usedFractionAtReading).toHaveLength(1_000_000);
		expect(meanCelsius).toBeCloseTo(3.95, 3);
		expect(codeOf(() => computeLifeOf({ model, readings: [...readings, [6e7, 0]] }))).toBe('invalid');
	});
});

describe('the JSON of a question', () => {
	it.each([
		['{"a":[1]}', { a: [1] }],
		['\uFEFF[1]', [1]],
		['"[[[[[[[[[[[[[[[[[[[[[[\\"[["', '[[[[[[[[[[[[[[[[[[[[[["[[']
	])('%j is read', (text, value) => {
		expect(parseBoundedJson(text)).toEqual(value);
	});

	it.each([
		['cut short', '{"a":', 'invalid'],
		['empty', '', 'invalid'],
		['seventeen deep', `${'['.repeat(17)}${']'.repeat(17)}`, 'invalid'],
		['a bomb of brackets', '['.repeat(5_000_000), 'invalid'],
		['larger than 60 MB', ' '.repeat(60_000_001), 'too-large']
	])('%s is refused', (_, text, code) => {
		expect(codeOf(() => parseBoundedJson(text))).toBe(code);
	});
});
