import { describe, expect, it } from 'vitest';
import type { Answers } from '../../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../../src/lib/domain/ingest/read-export';

/** Readings every ten minutes from 06:00 on 3 April 2026; the figures below are of this list, worked out by hand. */
const celsius = [4.0, 4.4, 4.8, 5.1, 5.4, 5.7];
const clock = (i: number) => `06.${String(i * 10).padStart(2, '0')}.00`;
const colons = (i: number) => clock(i).replaceAll('.', ':');

function read(text: string, answers: Answers = {}) {
	const answer = readExport(new TextEncoder().encode(text), {
		uploadedMs: Date.UTC(2026, 3, 20),
		siteZone: 'UTC',
		journeyFromMs: null,
		journeyToMs: null,
		answers
	});
	if (answer.kind !== 'ok') throw new Error(`${answer.kind}: ${JSON.stringify(answer)}`);
	return answer.understanding;
}

const rows = (row: (value: number, i: number) => string) => celsius.map(row).join('\n');

describe('files of the field that were once read otherwise', () => {
	it.each([
		[
			'a clock written with points beside a date written with points',
			`Date,Time,Temp °C\n${rows((v, i) => `2026.04.03,${clock(i)},${v}`)}`,
			undefined
		],
		[
			'the same with the clock first and a short year',
			`Uhrzeit;Datum;Temp °C\n${rows((v, i) => `${clock(i)};13.04.26;${v}`)}`,
			undefined
		],
		[
			'columns by spaces, whose one cell of date and time stands under two heads',
			`Date       Time      Temp\n${rows((v, i) => `2026-04-03 ${colons(i)}     ${v.toFixed(1)} C`)}`,
			undefined
		],
		[
			'a numbered probe beside the temperature',
			`time,temperature °C,probe 2 °F\n${rows((v, i) => `2026-04-03T${colons(i)}Z,${v},${40 + i / 10}`)}`,
			'temperature °C'
		]
	])('%s', (_what, text, column) => {
		const { channels, temperature, readings } = read(
			text,
			column === undefined ? {} : { temperatureColumn: column }
		);
		expect(readings).toBe(6);
		expect(channels[temperature]).toMatchObject({ minCelsius: 4, maxCelsius: 5.7 });
		expect(channels[temperature]?.meanCelsius).toBeCloseTo(4.9, 12);
	});

	it('heads above a row of units whose first cell is empty keep their names', () => {
		const { channels } = read(
			`Datum/Tijd;Temperatuur;Vochtigheid\n;°C;%RV\n${rows((v, i) => `2026-04-03 ${colons(i)};${v};80`)}`
		);
		expect(channels.map(({ name, quantity }) => [name, quantity])).toEqual([
			['Temperatuur', 'temperature'],
			['Vochtigheid', 'humidity']
		]);
	});

	it('one block for each quantity asks nothing: only one of them is a temperature', () => {
		const block = (name: string, unit: string, of: (v: number) => number) =>
			celsius.map((v, i) => ({ time: `2026-04-03T${colons(i)}Z`, value: of(v), channel: name, unit }));
		const text = JSON.stringify([
			...block('temperature', 'Cel', (v) => v),
			...block('humidity', '%RH', () => 80)
		]);
		const { channels, temperature } = read(text);
		expect(channels[temperature]).toMatchObject({ readings: 6, minCelsius: 4, maxCelsius: 5.7 });
	});
});
