import { describe, expect, it } from 'vitest';
import { readExport } from '../read-export';

const context = {
	uploadedMs: Date.UTC(2026, 3, 20, 10),
	siteZone: 'Europe/Berlin',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};
const rows = (stamp: (clock: string) => string) =>
	['08:10', '08:20', '08:30', '08:40'].map((clock) => `${stamp(clock)},4.5`).join('\n');

describe('what decided the zone', () => {
	it.each([
		['each time', `time,celsius\n${rows((clock) => `2026-04-19T${clock}:00+02:00`)}`, 'offset', '+02:00'],
		['each time, as Z', `time,celsius\n${rows((clock) => `2026-04-19T${clock}:00Z`)}`, 'offset', '+00:00'],
		['the head', `Time (UTC),celsius\n${rows((clock) => `2026-04-19 ${clock}:00`)}`, 'zone-named', '+00:00'],
		[
			'a line above',
			`Time zone: UTC+2\ntime,celsius\n${rows((clock) => `2026-04-19 ${clock}:00`)}`,
			'zone-named',
			'+02:00'
		],
		[
			'nothing but the site',
			`time,celsius\n${rows((clock) => `2026-04-19 ${clock}:00`)}`,
			'site',
			'Europe/Berlin'
		]
	])('was %s', (_, text, because, value) => {
		const found = readExport(new TextEncoder().encode(`${text}\n`), context);
		expect(found).toMatchObject({
			kind: 'ok',
			understanding: {
				decisions: expect.arrayContaining([expect.objectContaining({ field: 'zone', because, value })])
			}
		});
	});
});
