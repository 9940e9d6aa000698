import { describe, expect, it } from 'vitest';
import { utcOfLocal } from './local-times';
import { fixedOffsetOf, zoneNamedBy } from './zone';

const local = (...times: string[]): Float64Array =>
	Float64Array.from(times, (time) => Date.parse(`${time}:00Z`));
const shown = (times: Float64Array): string[] =>
	[...times].map((ms) => new Date(ms).toISOString().slice(5, 16));

describe('a zone', () => {
	it.each([
		['Europe/Berlin', 'Europe/Berlin'],
		['UTC', '+00:00'],
		['UTC+2', '+02:00'],
		['GMT-5', '-05:00'],
		['(UTC+05:30)', '+05:30'],
		['+0200', '+02:00'],
		['(UTC+01:00) Amsterdam, Berlin', 'Europe/Amsterdam'],
		['CEST', '+02:00'],
		['Mars/Base', null],
		['CST', null],
		['', null],
		['__proto__', null]
	])('is named by %j as %j', (text, zone) => {
		expect(zoneNamedBy(text)).toBe(zone);
	});

	it('has no offset beyond fourteen hours', () => {
		expect(fixedOffsetOf('+15:00')).toBeNull();
		expect(fixedOffsetOf('+14:00')).toBe(840);
	});
});

// Source of the changes: IANA time zone database, Europe/Berlin: 2026-03-29 02:00 to 03:00, 2026-10-25 03:00 to 02:00.
describe('local times', () => {
	it('before and after a change take the offset of their date', () => {
		expect(shown(utcOfLocal(local('2026-01-10T10:00', '2026-07-10T10:00'), 'Europe/Berlin').utc)).toEqual([
			'01-10T09:00',
			'07-10T08:00'
		]);
	});

	it('of the hour that stands twice are told apart by their order', () => {
		const { utc, change } = utcOfLocal(
			local(
				'2026-10-25T01:30',
				'2026-10-25T02:00',
				'2026-10-25T02:30',
				'2026-10-25T02:00',
				'2026-10-25T02:30',
				'2026-10-25T03:00'
			),
			'Europe/Berlin'
		);
		expect(shown(utc)).toEqual([
			'10-24T23:30',
			'10-25T00:00',
			'10-25T00:30',
			'10-25T01:00',
			'10-25T01:30',
			'10-25T02:00'
		]);
		expect(change).toBe('changed');
	});

	it('that run on evenly through autumn show a logger that kept its clock', () => {
		const { utc, change } = utcOfLocal(
			local(
				'2026-10-25T01:30',
				'2026-10-25T02:00',
				'2026-10-25T02:30',
				'2026-10-25T03:00',
				'2026-10-25T03:30'
			),
			'Europe/Berlin'
		);
		expect(shown(utc).at(-1)).toBe('10-25T01:30');
		expect(change).toBe('kept');
	});

	it('that skip an hour in spring show a clock put forward', () => {
		const { utc, change } = utcOfLocal(
			local('2026-03-29T01:00', '2026-03-29T01:30', '2026-03-29T03:00', '2026-03-29T03:30'),
			'Europe/Berlin'
		);
		expect(shown(utc)).toEqual(['03-29T00:00', '03-29T00:30', '03-29T01:00', '03-29T01:30']);
		expect(change).toBe('changed');
	});

	it('inside the hour that spring leaves out show a logger that kept its clock', () => {
		const { utc, change } = utcOfLocal(
			local('2026-03-29T01:30', '2026-03-29T02:00', '2026-03-29T02:30', '2026-03-29T03:00'),
			'Europe/Berlin'
		);
		expect(shown(utc)).toEqual(['03-29T00:30', '03-29T01:00', '03-29T01:30', '03-29T02:00']);
		expect(change).toBe('kept');
	});
});
