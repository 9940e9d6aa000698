import { describe, expect, it } from 'vitest';
import { daylightIn } from './daylight';
import { intervalsIn } from './interval-text';
import { foldedKey, isKeyOf } from './key-words';
import { zoneStatedIn } from './stated-zone';

const entry = (line: string) => {
	const at = line.indexOf(':');
	return { key: foldedKey(line.slice(0, at)), value: line.slice(at + 1).trim(), line: 1 };
};
const stated = (...lines: string[]) => zoneStatedIn(lines.map(entry), lines.join('\n'));

describe('a zone outside the readings', () => {
	it.each([
		['Time zone: UTC+02:00', '+02:00'],
		['Часовой пояс: UTC+3', '+03:00'],
		['Fus orar: GMT+02:00', '+02:00'],
		['Clock: UTC+01:00', '+01:00'],
		['Whatever: Europe/Berlin', 'Europe/Berlin'],
		['UTC offset: -5', '-05:00'],
		['UTC offset: 120', '+02:00']
	])('is taken: %s', (line, zone) => {
		expect(stated(line)).toMatchObject({ zone, word: null, unknown: null, named: [] });
	});

	it.each([
		'Time zone: local',
		'Zeitzone: Ortszeit',
		'Time zone: ',
		'Time zone: n/a',
		'Zone: Freezer 3',
		'Zone 2: A'
	])('is none, and none that would have to be asked about: %s', (line) => {
		expect(stated(line)).toMatchObject({ zone: null, word: null, unknown: null });
	});

	it.each(['Time zone: XQZ', 'Zeitzone: Depot Nord', 'Time zone: Mars/Phobos'])(
		'is one nobody knows: %s',
		(line) => {
			expect(stated(line).unknown).not.toBeNull();
		}
	);

	it('is kept with the other where two are named', () => {
		expect(stated('Device time zone: UTC+2', 'Report time zone: UTC+0').named).toEqual(['+02:00', '+00:00']);
		expect(stated('Device time zone: UTC+2', 'Report time zone: GMT+02:00').named).toEqual([]);
	});

	it('is two where three digits may be hours and minutes, or minutes', () => {
		expect(stated('Time zone offset: -300').named).toEqual(['-03:00', '-05:00']);
		// No zone is 1:20 or 4:80 from Greenwich.
		expect(stated('Time zone offset: +120')).toMatchObject({ zone: '+02:00', named: [] });
		expect(stated('Time zone offset: -480')).toMatchObject({ zone: '-08:00', named: [] });
	});

	it('is not that of a moment in the same line', () => {
		expect(stated('Exported: 30.04.2026 10:11 UTC+5').zone).toBeNull();
	});
});

describe('summer time', () => {
	it.each([
		['DST: on', true],
		['Daylight saving: yes', true],
		['Sommerzeit: ja', true],
		['Heure d’été: oui', true],
		['Zomertijd: aan', true],
		['夏时制: 是', true],
		['DST: off', false],
		['Summer time: 0', false],
		['Ora legale: no', false],
		['DST starts: 29.03.2026', null],
		['Time zone: UTC+1', null]
	])('is said to be kept or not: %s', (line, is) => {
		expect(daylightIn([entry(line)], null)).toBe(is);
	});

	it.each([
		['UTC+1 (DST on)', true],
		['UTC+1, daylight saving active', true],
		['UTC+1 without DST', false],
		['UTC+1', null]
	])('is said beside the zone: %s', (text, is) => {
		expect(daylightIn([], text)).toBe(is);
	});
});

describe('intervals outside the readings', () => {
	it.each([
		[['Interval: 10 min'], [10]],
		[['Transmission interval: 60 min', 'Logging interval: 10 min'], [10]],
		[['Alarm delay interval: 30 min', 'Interval: 10 min'], [10]],
		[['Interval: 10 min', 'Interval 2: 00:10:00'], [10]],
		[
			['Interval 1: 10 min', 'Interval 2: 30 min'],
			[10, 30]
		],
		[['Interval: 10'], []],
		[['Интервал: 10 мин'], [10]],
		[['記録間隔: 10分'], [10]],
		[['Kayıt aralığı: 10 dk'], [10]]
	])('%j are %j minutes', (lines, minutes) => {
		expect(intervalsIn(lines.map(entry))).toEqual(minutes);
	});
});

describe('keys', () => {
	it.each([
		['start', 'Starttidspunkt'],
		['start', 'Начало записи'],
		['start', 'Rozpoczęcie'],
		['stop', 'Окончание'],
		['serial', 'Sériové číslo'],
		['serial', 'シリアル番号'],
		['interval', 'Mittausväli'],
		['zone', 'Időzóna'],
		['unit', 'Mértékegység']
	] as const)('of %s: %s', (meaning, key) => {
		expect(isKeyOf(meaning, foldedKey(key))).toBe(true);
	});

	it.each([
		['start', 'Restart count'],
		['interval', 'Firmware'],
		['zone', 'Horizon']
	] as const)('not of %s: %s', (meaning, key) => {
		expect(isKeyOf(meaning, foldedKey(key))).toBe(false);
	});
});
