import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { roles, systemContext, type Role } from '../context';
import { Refusal } from '../refusals';
import { runCompute } from '../reads/run-reader';
import { answerCompute } from './answer-compute';
import { parseBoundedJson } from './bounded-json';
import { computeForCaller } from './compute-for-caller';
import { computeLifeOf } from './compute-life';

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
	it.each(roles)('of role %s', async (role) => {
		const asked = computeForCaller(callerWith(role), JSON.stringify(question));
		if (role === 'supplier') await expect(asked).rejects.toMatchObject({ code: 'not-allowed' });
		else expect(JSON.parse(await asked)).toEqual(computeLifeOf(question));
	});

	it('names the faulty field, whether the question is short or long', async () => {
		const faulty = [...question.readings, ['now', 4]];
		for (const padding of ['', ' '.repeat(200_000)]) {
			const asked = computeForCaller(callerWith('qa'), JSON.stringify({ model, readings: faulty }) + padding);
			await expect(asked).rejects.toMatchObject({
				code: 'invalid',
				issues: { 'readings.2.0': expect.stringContaining('no time') }
			});
		}
		await expect(computeForCaller(callerWith('qa'), '[')).rejects.toMatchObject({ code: 'invalid' });
	});

	it('is the same from a thread of its own', async () => {
		const program = join(process.cwd(), 'build/node/compute-worker.js');
		const [short, faulty] = [JSON.stringify(question), JSON.stringify({ model, readings: [] })];
		expect(await runCompute(short, program)).toEqual(answerCompute(short));
		expect(await runCompute(faulty, program)).toEqual(answerCompute(faulty));
		expect(await runCompute('[', program)).toEqual(answerCompute('['));
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
