import { describe, expect, it } from 'vitest';
import { inspectAnswers } from '../../schemas/inspect';
import { inspect } from './inspect-export';

const nowMs = Date.parse('2026-05-01T00:00:00Z');

function faultsOf(text: string, given: Record<string, string>): Record<string, string> {
	const bytes = new TextEncoder().encode(text);
	return inspect({ bytes, answers: inspectAnswers.parse(given), siteZone: null, nowMs }).faults;
}

function warningsOf(text: string, given: Record<string, string>): string[] {
	const bytes = new TextEncoder().encode(text);
	const { answer } = inspect({ bytes, answers: inspectAnswers.parse(given), siteZone: null, nowMs });
	return answer.warnings.filter(({ code }) => code === 'answer-unused').map(({ message }) => message);
}

const rows = ['2026-04-13 10:00', '2026-04-13 10:10', '2026-04-13 10:20'];
const one = `time,temp °C\n${rows.map((at, i) => `${at},4.${i}`).join('\n')}\n`;
const probes = `time,air °C,pulp °C\n${rows.map((at, i) => `${at},4.${i},5.${i}`).join('\n')}\n`;
const loggers = `Serial;A1\ntime;temp °C\n${rows.map((at, i) => `${at};4.${i}`).join('\n')}\n\nSerial;B2\ntime;temp °C\n${rows.map((at, i) => `${at};6.${i}`).join('\n')}\n`;

describe('an answer', () => {
	it.each([
		['a column that is not there', one, { column: 'pulp' }, 'column'],
		['a column that is not among several', probes, { column: 'core' }, 'column'],
		['a recording beyond the last', loggers, { part: 'fifth' }, 'part'],
		['a second recording where there is one', one, { part: 'second' }, 'part'],
		['a part of a restart where the file has recordings', loggers, { part: 'joined' }, 'part'],
		['a unit in which no figure is possible', one, { unit: 'K' }, 'unit']
	])('that names %s is told as a fault of its field', (_, text, given, field) => {
		expect(Object.keys(faultsOf(text, given))).toEqual([field]);
	});

	it('that is wrong names what the file offers', () => {
		expect(faultsOf(probes, { column: 'core' }).column).toContain('air °C, pulp °C');
		expect(faultsOf(loggers, { part: 'fifth' }).part).toContain('first, second');
	});

	it.each([
		['a column by its head', probes, { column: 'pulp °C' }],
		['a column by its head in other letters', probes, { column: 'PULP °C' }],
		['a recording', loggers, { part: 'second' }],
		['the only recording', one, { part: 'first' }],
		['nothing', one, {}]
	])('that names %s has no fault', (_, text, given) => {
		expect(faultsOf(text, given)).toEqual({});
	});

	it('that the file has no use for is told, and changes nothing', () => {
		expect(warningsOf(one, { start: '2026-04-01T00:00:00Z', dateOrder: 'MDY' })).toEqual([
			'The file has no use for what was answered: dateOrder, start.'
		]);
		expect(warningsOf(one, { zone: 'Europe/Amsterdam' })).toEqual([]);
		// A day over 12 stands first: read month first, the file would have no day at all.
		const days = 'time,temp °C\n13/04/2026 10:00,4.0\n13/04/2026 10:10,4.1\n';
		expect(warningsOf(days, { dateOrder: 'MDY' })).toHaveLength(1);
	});

	it.each(['IST', 'Mars/Phobos', '+25:00', 'nowhere'])('of the zone %s is none', (zone) => {
		expect(inspectAnswers.safeParse({ zone }).success).toBe(false);
	});

	it.each(['Europe/Amsterdam', '+02:00', 'UTC', 'Japan', 'EST5EDT', 'Z'])('of the zone %s is one', (zone) => {
		expect(inspectAnswers.safeParse({ zone }).success).toBe(true);
	});
});
