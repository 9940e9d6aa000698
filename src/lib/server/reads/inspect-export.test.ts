import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { inspectAnswers, type InspectAnswer } from '../../schemas/inspect';
import { inspectExport } from './inspect-export';

const nowMs = Date.parse('2026-05-01T00:00:00Z');

function inspect(text: string | Uint8Array, given: Record<string, string> = {}): InspectAnswer {
	const bytes = typeof text === 'string' ? new TextEncoder().encode(text) : text;
	return inspectExport({ bytes, answers: inspectAnswers.parse(given), siteZone: null, nowMs });
}

const keys = ['outcome', 'questions', 'refusal', 'warnings', 'decisions', 'channels'];

/** Answers every question with one of its choices until none is left. */
function settle(text: string, pick: (choices: number) => number): InspectAnswer {
	const given: Record<string, string> = {};
	for (let round = 0; round < 8; round++) {
		const answer = inspect(text, given);
		const [question, second] = answer.questions;
		expect(second).toBeUndefined();
		if (!question) return answer;
		expect(given).not.toHaveProperty(question.field);
		given[question.field] = question.choices[pick(question.choices.length)]?.value ?? '';
	}
	throw new Error('The file never stops asking.');
}

const head = 'time,temperature °C,humidity %,probe 2 °F,battery V\n';
const several = `${head}2026-04-03T10:00:00Z,4.5,81,40.1,3.1
2026-04-03T10:10:00Z,-999,82,41.0,3.1
2026-04-03T10:20:00Z,4.7,,41.9,3.1
2026-04-03T10:30:00Z,4.8,84
2026-04-03T10:50:00Z,5.0,85,42.8,3.0
`;

describe('an inspection', () => {
	it('has every key whatever comes of it', () => {
		for (const text of [several, 'time,temp\n2026-04-03 10:00,40\n2026-04-03 10:10,41\n', ''])
			expect(Object.keys(inspect(text))).toEqual(keys);
	});

	it('tells each channel with its own readings, missing rows, steps and figures', () => {
		// Worked out by hand: −999 is no temperature, one row ends early, one cell is empty.
		const { channels } = inspect(several, { column: 'temperature °C' });
		expect(channels).toEqual([
			{
				name: 'temperature °C',
				quantity: 'temperature',
				unit: 'Cel',
				primary: true,
				readings: 4,
				missing: 1,
				firstAt: '2026-04-03T10:00:00.000Z',
				lastAt: '2026-04-03T10:50:00.000Z',
				minCelsius: 4.5,
				maxCelsius: 5,
				meanCelsius: 4.75,
				intervalSeconds: 1200,
				longSteps: []
			},
			expect.objectContaining({
				name: 'humidity %',
				quantity: 'humidity',
				unit: '%',
				readings: 4,
				missing: 1
			}),
			expect.objectContaining({
				name: 'probe 2 °F',
				quantity: 'temperature',
				unit: '[degF]',
				primary: false,
				readings: 4,
				missing: 1,
				minCelsius: 4.5,
				maxCelsius: 6,
				meanCelsius: 5.25
			}),
			expect.objectContaining({ name: 'battery V', quantity: 'other', minCelsius: null, meanCelsius: null })
		]);
	});

	it('takes the mean where minimum and maximum stand beside it', () => {
		const answer = inspect(
			'time,Min °C,Mean °C,Max °C\n2026-04-03T10:00:00Z,1,2,3\n2026-04-03T10:10:00Z,1,2,4\n'
		);
		expect(answer.channels.map(({ name, primary }) => [name, primary])).toEqual([
			['Mean °C', true],
			['Min °C', false],
			['Max °C', false]
		]);
		expect(answer.decisions).toContainEqual({ field: 'column', value: 'Mean °C', because: 'mean' });
	});

	it('lists steps over one and a half times the usual one, and no shorter', () => {
		const minutes = [0, 10, 20, 35, 51, 61, 71];
		const rows = minutes.map(
			(m) => `${new Date(Date.parse('2026-04-03T10:00Z') + m * 60_000).toISOString()},4.5`
		);
		expect(inspect(`time,temp °C\n${rows.join('\n')}\n`).channels[0]?.longSteps).toEqual([
			['2026-04-03T10:35:00.000Z', '2026-04-03T10:51:00.000Z']
		]);
	});

	it('keeps its head and first rows where the sensor was silent at the start', () => {
		const text =
			'Time,Temp °C\n2026-03-01T00:00Z,ERR\n2026-03-01T00:05Z,---\n2026-03-01T00:10Z,4.0\n2026-03-01T00:15Z,n/a\n2026-03-01T00:20Z,NaN\n2026-03-01T00:25Z,-127\n2026-03-01T00:30Z,4.2\n';
		expect(inspect(text).channels).toMatchObject([{ name: 'Temp °C', readings: 2, missing: 5 }]);
	});

	it('counts no row as missing at which a channel of single records was not due', () => {
		const text =
			'[{"bn":"urn:dev:mac:1:","bt":1770000000,"bu":"Cel","n":"t","v":4.5},{"n":"t","t":60,"v":4.6},{"n":"h","u":"%RH","v":80}]';
		expect(inspect(text).channels.map(({ readings, missing }) => [readings, missing])).toEqual([
			[2, 0],
			[1, 0]
		]);
	});

	it('says what decided', () => {
		const text = 'Zone: Europe/Paris\n\ntime;temp °C\n13.04.2026 10:00;4,5\n13.04.2026 10:10;4,6\n';
		expect(inspect(text).decisions).toEqual(
			expect.arrayContaining([
				{ field: 'dateOrder', value: 'DMY', because: 'day-over-12' },
				{ field: 'zone', value: 'Europe/Paris', because: 'zone-named' },
				{ field: 'unit', value: 'Cel', because: 'head' },
				{ field: 'column', value: 'temp °C', because: 'only-one' },
				{ field: 'delimiter', value: ';', because: 'found' },
				{ field: 'decimal', value: ',', because: 'found' }
			])
		);
	});
});

describe('a question', () => {
	it('shows first and last reading as each choice would have them', () => {
		const text = 'time,temp °C\n03/04/2026 10:00,4.5\n03/04/2026 10:10,4.7\n';
		expect(inspect(text).questions).toMatchObject([
			{
				field: 'dateOrder',
				choices: [
					{ value: 'DMY', first: '2026-04-03 10:00:00 UTC, 4.5 °C', last: '2026-04-03 10:10:00 UTC, 4.7 °C' },
					{ value: 'MDY', first: '2026-03-04 10:00:00 UTC, 4.5 °C', last: '2026-03-04 10:10:00 UTC, 4.7 °C' }
				]
			}
		]);
	});

	it.each([
		['order and unit', 'time,temp\n03/04/2026 10:00,38\n03/04/2026 10:10,38.5\n'],
		['columns', 'time,Probe 1 °C,Probe 2 °C\n2026-04-03T10:00:00Z,1,2\n2026-04-03T10:10:00Z,1,2\n'],
		['columns of one name', 'time,°C,°C\n2026-04-03T10:00:00Z,1,2\n2026-04-03T10:10:00Z,1,2\n'],
		['an interval', 'Start: 2026-04-03T10:00:00Z\n\nNo,temp °C\n1,4.5\n2,4.6\n3,4.7\n'],
		['everything', 'time,Probe 1,Probe 2\n03/04/2026 10:00,38,39\n03/04/2026 10:10,38.5,39\n']
	])('about %s is settled by any of its values', (_, text) => {
		expect(inspect(text).outcome).toBe('question');
		expect(settle(text, () => 0).outcome).toBe('ok');
		expect(settle(text, (choices) => choices - 1).outcome).toBe('ok');
	});

	it('about the column reads the column that was named', () => {
		const text = 'time,Probe 1 °C,Probe 2 °C\n2026-04-03T10:00:00Z,1,2\n2026-04-03T10:10:00Z,1,2\n';
		expect(inspect(text, { column: 'probe 2 °c' }).channels[0]).toMatchObject({
			name: 'Probe 2 °C',
			primary: true,
			meanCelsius: 2
		});
	});
});

describe('a refusal', () => {
	it.each([
		['empty', ''],
		['not-text', '%PDF-1.7\n'],
		['not-text', new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])],
		['not-text', new Uint8Array([0x50, 0x4b, 0x03, 0x04, 0, 0, 0, 0])],
		['web-page', '<!doctype html><html><body>Sign in</body></html>'],
		['no-readings', 'time,temperature °C\n'],
		['no-temperature', 'time,humidity %\n2026-04-03T10:00:00Z,81\n2026-04-03T10:10:00Z,81\n'],
		['json-syntax', '[{"time": "2026-04-03T10:00:00Z", "temp": 4.5},, {]'],
		['truncated', '[{"time": "2026-04-03T10:00:00Z", "temp": 4.5}, {"ti'],
		['truncated', gzipSync(new TextEncoder().encode(several.repeat(20))).subarray(0, 60)],
		['truncated', gzipSync(new TextEncoder().encode(several)).subarray(0, -3)],
		['too-deep', '['.repeat(5000)],
		['line-too-long', `time,temp °C\n${'x'.repeat(70_000)}\n`],
		['no-time-progress', 'time,temp °C\n2026-04-03T10:00:00Z,4.5\n'],
		['implausible-dates', 'time,temp °C\n1970-01-01T00:00:10Z,4.5\n1970-01-01T00:10:10Z,4.5\n'],
		['implausible-dates', 'time,temp °C\n2099-01-01T00:00:10Z,4.5\n2099-01-01T00:10:10Z,4.5\n']
	])('is %s', (code, text) => {
		const answer = inspect(text);
		expect(answer).toMatchObject({ outcome: 'refused', channels: [], questions: [], refusal: { code } });
		expect(answer.refusal?.message).toMatch(/\.$/);
	});
});
