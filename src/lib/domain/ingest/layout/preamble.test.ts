import { describe, expect, it } from 'vitest';
import { entryOf } from './entries';
import { intervalOf } from './interval-text';
import { statedIn } from './preamble';
import type { Entry } from './table';

const entries = (...pairs: [string, string][]): Entry[] =>
	pairs.map(([key, value], i) => ({ key, value, line: i + 1 }));
const stated = (...pairs: [string, string][]): ReturnType<typeof statedIn> =>
	statedIn(entries(...pairs), pairs.map(([key, value]) => `${key}: ${value}`).join('\n'), []);

describe('lines above the readings', () => {
	it.each([
		['Serial Number', 'SB-30411'],
		['S/N', 'SB-30411'],
		['Seriennummer', 'SB-30411'],
		['N° de série', 'SB-30411'],
		['Número de serie', 'SB-30411'],
		['Número de série', 'SB-30411'],
		['Numero di serie', 'SB-30411'],
		['Serienummer', 'SB-30411'],
		['Numer seryjny', 'SB-30411'],
		['Logger', 'SB-30411'],
		['序列号', 'SB-30411']
	])('name the logger: %s', (key, value) => {
		expect(stated([key, value]).serial).toBe('SB-30411');
	});

	it.each([
		['10 min', 'Interval', 10],
		['00:10:00', 'Logging interval', 10],
		['600 s', 'Messintervall', 10],
		['600', 'Interval (s)', 10],
		['10', 'Interval (min)', 10],
		['1 h', 'Intervalle', 60],
		['0:15', 'Intervalo', 15],
		['15 Minuten', 'Takt', 15],
		['PT15M', 'interval', 15],
		['300', 'interval_seconds', 5],
		['10', 'Interval', null],
		['fast', 'Interval', null]
	])('give an interval: %j under %j', (value, key, minutes) => {
		expect(intervalOf(value, key.toLowerCase().replace('_', ' '))).toBe(minutes);
	});

	it('give start, zone and unit', () => {
		const facts = stated(['Startzeit', '03.04.2026 10:00'], ['Zeitzone', 'Europe/Berlin'], ['Einheit', '°C']);
		expect(facts).toMatchObject({ startText: '03.04.2026 10:00', zone: 'Europe/Berlin', unit: 'celsius' });
	});

	it('put a start together from a date and a time', () => {
		expect(stated(['Start date', '2026-04-03'], ['Start time', '10:00']).startText).toBe('2026-04-03 10:00');
	});

	it('name a unit only where all of them name the same', () => {
		expect(stated(['Alarm high', '5 °C']).unit).toBe('celsius');
		expect(stated(['Alarm high', '5 °C'], ['Alarm low', '30 °F']).unit).toBeNull();
	});

	it('keep letters that stand for several zones apart from a zone', () => {
		expect(stated(['Time zone', 'CST'])).toMatchObject({ zone: null, zoneWord: 'CST' });
	});

	it.each([
		['Serial: SB-1', ['Serial: SB-1'], ['Serial', 'SB-1']],
		['Serial;SB-1;;', ['Serial', 'SB-1', '', ''], ['Serial', 'SB-1']],
		['# Start = 2026-04-03 10:00', ['# Start = 2026-04-03 10:00'], ['Start', '2026-04-03 10:00']],
		['Start: 2026-04-03 10:00', ['Start: 2026-04-03 10:00'], ['Start', '2026-04-03 10:00']]
	])('are keys and values: %j', (line, cells, [key, value]) => {
		expect(entryOf(line, cells, 1)).toEqual({ key, value, line: 1 });
	});

	it('are not always', () => {
		expect(entryOf('Report of the journey', ['Report of the journey'], 1)).toBeNull();
	});
});
