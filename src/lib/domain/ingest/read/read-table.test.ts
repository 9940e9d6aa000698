import { describe, expect, it } from 'vitest';
import type { Ingestion, ReadContext, Understanding } from '../ingestion';
import { readExport } from '../read-export';

const context: ReadContext = {
	uploadedMs: Date.UTC(2026, 3, 20, 12),
	siteZone: 'Europe/Berlin',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};
const read = (text: string, more: Partial<ReadContext> = {}): Ingestion =>
	readExport(new TextEncoder().encode(text), { ...context, ...more });

function understood(ingestion: Ingestion): Understanding {
	if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion));
	return ingestion.understanding;
}
const first = (ingestion: Ingestion): string => new Date(understood(ingestion).firstMs).toISOString();
const oddity = (ingestion: Ingestion, code: string): unknown =>
	understood(ingestion).oddities.find((o) => o.code === code);
const oneDay = 'Time,°C\n03/04/2026 10:00,4.5\n03/04/2026 10:10,4.6\n03/04/2026 10:20,4.7\n';

describe('day and month', () => {
	it('are asked where the file and the docket leave them open, with the rows and both answers', () => {
		const ingestion = read(oneDay);
		expect(ingestion).toMatchObject({
			kind: 'question',
			question: {
				code: 'date-order',
				subject: '03/04',
				why: 'all-one-day',
				choices: [
					{ label: 'dmy', firstMs: Date.UTC(2026, 3, 3, 8), firstCelsius: 4.5 },
					{ label: 'mdy', firstMs: Date.UTC(2026, 2, 4, 9), firstCelsius: 4.5 }
				],
				rows: [
					{ line: 2, text: '03/04/2026 10:00,4.5', marks: [{ from: 0, to: 5 }] },
					{ line: 3 },
					{ line: 4 }
				]
			}
		});
	});

	it('follow the answer', () => {
		expect(first(read(oneDay, { answers: { dateOrder: 'mdy' } }))).toBe('2026-03-04T09:00:00.000Z');
	});

	it('are settled by the journey, which is told', () => {
		const ingestion = read(oneDay, {
			journeyFromMs: Date.UTC(2026, 2, 3),
			journeyToMs: Date.UTC(2026, 2, 5)
		});
		expect(first(ingestion)).toBe('2026-03-04T09:00:00.000Z');
		expect(oddity(ingestion, 'date-order-by-journey')).toMatchObject({ detail: 'mdy' });
	});

	it('are settled by the upload where the other order lies ahead of it', () => {
		const ingestion = read(oneDay, { uploadedMs: Date.UTC(2026, 2, 10) });
		expect(first(ingestion)).toBe('2026-03-04T09:00:00.000Z');
		expect(oddity(ingestion, 'date-order-by-upload')).toMatchObject({ detail: 'mdy' });
	});

	it.each([
		['Printed: 25/04/2026\n', '2026-04-03T08:00:00.000Z'],
		['Printed: 04/25/2026\n', '2026-03-04T09:00:00.000Z'],
		['Date format: DD/MM/YYYY\n', '2026-04-03T08:00:00.000Z'],
		['Start: 2026-03-04 10:00\n', '2026-03-04T09:00:00.000Z']
	])('are settled by what the preamble states: %j', (preamble, expected) => {
		const ingestion = read(`${preamble}\n${oneDay}`);
		expect(first(ingestion)).toBe(expected);
		expect(understood(ingestion).layout.dateOrderBy).toBe('declared');
	});

	it('are settled by a day over 12 anywhere in the file, also at its very end', () => {
		const rows = Array.from({ length: 3000 }, (_, i) => new Date(Date.UTC(2026, 3, 1) + i * 360_000));
		const two = (n: number): string => String(n).padStart(2, '0');
		const text = rows.map(
			(d) =>
				`${two(d.getUTCDate())}/${two(d.getUTCMonth() + 1)}/2026 ${two(d.getUTCHours())}:${two(d.getUTCMinutes())},4.5`
		);
		expect(understood(read(`Time,°C\n${text.join('\n')}\n`)).layout).toMatchObject({
			dateOrder: 'dmy',
			dateOrderBy: 'day-over-12'
		});
	});
});

describe('times without a time column', () => {
	it.each([
		['Start: 2026-04-03 10:00\nInterval: 10 min\nNo,°C\n1,4.5\n2,4.6\n', '2026-04-03T08:00:00.000Z'],
		['Start: 2026-04-03T10:00:00Z\nElapsed (min),°C\n0,4.5\n10,4.6\n', '2026-04-03T10:00:00.000Z'],
		['Start: 2026-04-03 10:00\nElapsed (min),°C\n0,4.5\n10,4.6\n', '2026-04-03T08:00:00.000Z'],
		['Start: 2026-04-03 23:50\nTime,°C\n23:50,4.5\n00:00,4.6\n00:10,4.7\n', '2026-04-03T21:50:00.000Z']
	])('run on from the stated start: %j', (text, expected) => {
		const ingestion = read(text);
		expect(first(ingestion)).toBe(expected);
		expect(understood(ingestion).usualIntervalMs).toBe(600_000);
	});

	it('ask for the start or the interval that is not stated', () => {
		expect(read('Start: 2026-04-03 10:00\nNo,°C\n1,4.5\n2,4.6\n')).toMatchObject({
			question: { code: 'interval' }
		});
		expect(read('Interval: 10 min\nNo,°C\n1,4.5\n2,4.6\n')).toMatchObject({ question: { code: 'start' } });
		expect(read('No,°C\n1,4.5\n2,4.6\n')).toMatchObject({ kind: 'refused', code: 'no-time' });
	});
});

describe('units and columns', () => {
	const rows = (cells: string): string =>
		`2026-04-03T10:00:00Z,${cells}\n2026-04-03T10:10:00Z,${cells}\n2026-04-03T10:20:00Z,${cells}\n`;

	it.each([
		['time,t °F\n', '41.0', 'fahrenheit'],
		['Unit: °F\n\ntime,temperature\n', '41.0', 'fahrenheit'],
		['time,temperature\n', '41.0 °F', 'fahrenheit'],
		['time,temperature\niso,°F\n', '41.0', 'fahrenheit'],
		['time,temperature,unit\n', '41.0,F', 'fahrenheit'],
		['time,temperature (K)\n', '278.15', 'kelvin']
	])('are taken from the head, preamble, values or a row of units: %j', (head, cells, unit) => {
		const [channel] = understood(read(head + rows(cells))).channels;
		expect([channel?.trace?.unit, channel?.minCelsius]).toEqual([unit, 5]);
	});

	it('of two kinds in one column are refused, whatever the head says', () => {
		const text = 'time,temperature °C\n2026-04-03T10:00:00Z,4.5 °C\n2026-04-03T10:10:00Z,40.1 °F\n';
		expect(read(text)).toMatchObject({ kind: 'refused', code: 'two-recordings' });
	});

	it('are never guessed from figures that look like one', () => {
		expect(read(`time,temperature\n${rows('38.5')}`)).toMatchObject({
			kind: 'question',
			question: { code: 'unit' }
		});
	});

	it('leave limits, set-points, battery and counters aside', () => {
		const text = `No,time,Temperature °C,Low limit °C,Set point °C,Battery V\n1,2026-04-03T10:00:00Z,1.5,0,2,3.1\n2,2026-04-03T10:10:00Z,1.6,0,2,3.1\n`;
		expect(understood(read(text)).channels.map(({ name }) => name)).toEqual(['Temperature °C', 'Battery V']);
	});

	it('prefer the mean to the extremes beside it', () => {
		const text = `time,Min °C,Mean °C,Max °C\n${rows('1,2,3')}`;
		expect(understood(read(text)).channels[0]?.name).toBe('Mean °C');
	});

	it('tell where the other unit disagrees', () => {
		const text = 'time,Temp °C,Temp °F\n2026-04-03T10:00:00Z,1.5,34.7\n2026-04-03T10:10:00Z,2.0,39.0\n';
		expect(oddity(read(text), 'twin-disagrees')).toMatchObject({ count: 1, lines: [3] });
	});
});

describe('oddities', () => {
	const at = (minute: number): string => new Date(Date.UTC(2026, 3, 3) + minute * 60_000).toISOString();
	const series = (minutes: readonly number[], value: (i: number) => string = () => '4.5'): Ingestion =>
		read(`time,celsius\n${minutes.map((minute, i) => `${at(minute)},${value(i)}`).join('\n')}\n`);
	const every = (count: number, step: number, from = 0): number[] =>
		Array.from({ length: count }, (_, i) => from + i * step);

	it('name a gap over three intervals and half an hour, not a shorter one', () => {
		expect(oddity(series([...every(10, 10), ...every(10, 10, 130)]), 'gap')).toMatchObject({
			count: 1,
			lines: [12],
			detail: '40'
		});
		expect(oddity(series([...every(10, 10), ...every(10, 10, 120)]), 'gap')).toBeUndefined();
		expect(oddity(series([...every(10, 1), ...every(10, 1, 30)]), 'gap')).toBeUndefined();
	});

	it('name a lasting change of interval', () => {
		expect(oddity(series([...every(10, 10), ...every(10, 5, 95)]), 'interval-changed')).toMatchObject({
			detail: '10 > 5'
		});
	});

	it('set aside what cannot be a temperature, and a fault figure after a leap', () => {
		const ingestion = series(every(10, 10), (i) => (i === 3 ? '-127' : i === 5 ? '999.9' : '4.5'));
		expect(oddity(ingestion, 'impossible-value')).toMatchObject({ count: 2, lines: [5, 7] });
		expect(understood(ingestion).channels[0]?.minCelsius).toBe(4.5);
	});

	it('leave a value such as −99 alone where the whole journey is that cold', () => {
		expect(
			oddity(
				series(every(5, 10), () => '-99'),
				'impossible-value'
			)
		).toBeUndefined();
	});

	it('count readings later than the upload', () => {
		const late = Array.from({ length: 5 }, (_, i) => 60 * 24 * 17 + 12 * 60 + (i - 2) * 10);
		expect(oddity(series(late), 'future-reading')).toMatchObject({ count: 2 });
	});

	it('refuse a file whose time stands still, and one with a single reading', () => {
		expect(series([0, 0, 0], (i) => `4.${i}`)).toMatchObject({ kind: 'refused', code: 'no-time-progress' });
		expect(series([0])).toMatchObject({ kind: 'refused', code: 'one-reading' });
	});

	it('skip repeated heads and tell bad rows with their lines', () => {
		const text = `time,celsius\n${at(0)},4.5\n${at(10)},4.6\ntime,celsius\nbroken,4.6\n${at(20)},4.7\n`;
		expect(understood(read(text)).readings).toBe(3);
		expect(oddity(read(text), 'header-repeated')).toMatchObject({ lines: [4] });
		expect(oddity(read(text), 'bad-time')).toMatchObject({ lines: [5] });
	});
});

describe('a layout', () => {
	it('has the same fingerprint for every file of its make, and another for another', () => {
		const one = understood(
			read('Serial,SB-1\n\ntime,celsius\n2026-04-03T10:00:00Z,4\n2026-04-03T10:10:00Z,4\n')
		).layout.fingerprint;
		const two = understood(
			read('Serial,SB-2\n\ntime,celsius\n2026-04-05T10:00:00Z,7\n2026-04-05T10:10:00Z,4\n')
		).layout.fingerprint;
		const other = understood(read('time;celsius\n2026-04-05T10:00:00Z;7\n2026-04-05T10:10:00Z;4\n')).layout
			.fingerprint;
		expect(two).toBe(one);
		expect(other).not.toBe(one);
	});

	it('is known by its heads, not by the sensors that its rows name', () => {
		const rows = (a: string, b: string) =>
			['time;sensor;temperature °C']
				.concat(
					[0, 1, 2].flatMap((i) => [
						`2026-04-03T10:${i}0:00Z;${a};4.${i}`,
						`2026-04-03T10:${i}0:00Z;${b};9.${i}`
					])
				)
				.join('\n');
		const print = (text: string) => {
			const first = read(text);
			if (first.kind !== 'question') return understood(first).layout.fingerprint;
			const { answer } = first.question.choices[0] ?? { answer: {} };
			return understood(read(text, { answers: answer })).layout.fingerprint;
		};
		expect(print(rows('Probe A', 'Probe B'))).toBe(print(rows('17-004', '17-009')));
	});
});
