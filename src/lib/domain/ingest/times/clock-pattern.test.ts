import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clockPatternOf } from './clock-pattern';
import { emptyStamp, scanStamp } from './stamp';

/** Reads `second` by the pattern of `first`; null where the pattern declines. */
function byPattern(first: string, second: string): number | null {
	const stamp = emptyStamp();
	if (!scanStamp(first, stamp)) return null;
	const pattern = clockPatternOf(first + second);
	if (!pattern.learn(0, first.length, stamp.msOfDay)) return null;
	const ms = pattern.read(first.length, first.length + second.length);
	return ms < 0 ? null : ms;
}
const at = (hours: number, minutes: number, seconds = 0, ms = 0) =>
	((hours * 60 + minutes) * 60 + seconds) * 1000 + ms;

describe('a clock pattern', () => {
	it.each([
		['2026-04-01T10:00:00Z', '2026-04-01T23:59:58Z', at(23, 59, 58)],
		['01.04.2026 9:50', '01.04.2026 10:00', at(10, 0)],
		['10:00', '09:10', at(9, 10)],
		['2026-04-01 10:00:00.250+02:00', '2026-04-01 10:00:01.250+02:00', at(10, 0, 1, 250)]
	])('of %j reads %j', (first, second, expected) => {
		expect(byPattern(first, second)).toBe(expected);
	});

	it.each([
		['another date', '2026-04-01 10:00', '2026-04-02 10:00'],
		['another offset', '2026-04-01 10:00+02:00', '2026-04-01 10:10+01:00'],
		['another fraction', '2026-04-01 10:00:00.250', '2026-04-01 10:00:00.500'],
		['seconds that came or went', '2026-04-01 10:00', '2026-04-01 10:00:30'],
		['an hour that is none', '2026-04-01 10:00', '2026-04-01 24:00'],
		['a minute that is none', '2026-04-01 10:00', '2026-04-01 10:60'],
		['a half of the day', '1/4/2026 10:00 AM', '1/4/2026 10:10 AM'],
		['a month by name', '1 Apr 2026 10:00', '1 Apr 2026 10:10'],
		['no clock', '20260401', '20260401'],
		['a broken clock', '2026-04-01 10:00', '2026-04-01 10.00']
	])('declines %s', (_, first, second) => {
		expect(byPattern(first, second)).toBeNull();
	});

	it('never reads a time otherwise than it is read in full', () => {
		const two = fc.integer({ min: 0, max: 61 }).map((n) => String(n).padStart(2, '0'));
		const clock = fc
			.tuple(
				two,
				two,
				fc.constantFrom('', ':05', ':59', ':60'),
				fc.constantFrom('', 'Z', '.5', ' +02:00', ' PM')
			)
			.map(([h, m, s, end]) => `${h}:${m}${s}${end}`);
		const date = fc.constantFrom('', '2026-04-01 ', '2026-04-01T', '1/4/26 ', '01-04-2026, ');
		fc.assert(
			fc.property(date, clock, clock, (day, first, second) => {
				const ms = byPattern(day + first, day + second);
				const whole = emptyStamp();
				if (ms !== null) expect([scanStamp(day + second, whole), whole.msOfDay]).toEqual([true, ms]);
			}),
			{ numRuns: 5000, seed: 12 }
		);
	});
});
