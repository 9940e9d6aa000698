// @vitest-environment node
import { describe, expect, it } from 'vitest';
import { readExport } from '$lib/domain/ingest/read-export';
import { glanceOf } from './file-glance';
import { glanceLines, standingOf, summaryWords } from './upload-words';
import type { UploadItem } from './upload-queue.svelte';

const eyes = { zone: 'Europe/Berlin', unit: 'celsius' } as const;
const context = {
	uploadedMs: Date.UTC(2026, 3, 20, 12),
	siteZone: 'Europe/Berlin',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};
const lines = (text: string) =>
	glanceLines(
		glanceOf(readExport(new TextEncoder().encode(text), context), { lines: [], loggers: [] }),
		eyes
	);
type Standing = Pick<UploadItem, 'step' | 'read'>;
const read = (state: string, isDuplicate = false) =>
	({ state, isDuplicate }) as NonNullable<UploadItem['read']>;

describe('what this device says of a file before it is sent', () => {
	it('is how many readings of when, each channel, and what is odd', () => {
		const rows = [0, 10, 20, 30, 90].map(
			(m) => `2026-04-03T${m < 60 ? '10' : '11'}:${String(m % 60).padStart(2, '0')}:00Z,${4 + m / 10},80`
		);
		expect(lines(['time,Probe °C,RH %', ...rows, ''].join('\n'))).toEqual([
			'5 readings, every 10 min, Fri 3 Apr 12:00 to 13:30 CEST',
			'Probe °C, to be assessed: 4.0 to 13.0 °C',
			'RH %: humidity, 5 values',
			expect.stringMatching(/^1 gap of 1 h/)
		]);
	});

	it('is the life that would be left, with its range and what is needed', () => {
		const life = {
			serial: 'WH-1',
			line: 'Line 1',
			remainingHours: { value: 130, low: 120, high: 139 },
			neededHours: 144,
			excursions: 1,
			hasStop: false
		};
		const found = { kind: 'ok', readings: 2, firstMs: 0, lastMs: 0, usualIntervalMs: 60_000 } as const;
		expect(glanceLines({ ...found, channels: [], oddities: [], lives: [life] }, eyes)[1]).toBe(
			'Line 1, by logger WH-1: life left 5.4 d (5.0–5.8), short of the 6.0 d needed, 1 excursion'
		);
	});

	it('is its question, or why it cannot be read', () => {
		const oneDay = 'Time,°C\n03/04/2026 10:00,4.5\n03/04/2026 10:10,4.6\n03/04/2026 10:20,4.7\n';
		expect(lines(oneDay)).toEqual(['Will ask: Is 03/04 the 3rd of April or the 4th of March?']);
		expect(lines('%PDF-1.7')).toEqual([expect.stringContaining('This is a PDF.')]);
	});
});

describe('where files stand', () => {
	it.each<[Standing, string]>([
		[{ step: 'reading', read: null }, 'Being read here'],
		[{ step: 'queued', read: null }, 'To be sent'],
		[{ step: 'sending', read: null }, 'Being sent'],
		[{ step: 'no-network', read: null }, 'Waits for the network'],
		[{ step: 'failed', read: null }, 'Not taken'],
		[{ step: 'stopped', read: null }, 'Stopped'],
		[{ step: 'sent', read: read('question') }, 'Asks one question'],
		[{ step: 'sent', read: read('refused') }, 'Cannot be read']
	])('is a word beside a mark: %o', (item, word) => {
		expect(standingOf(item).word).toBe(word);
	});

	it('is summed up with what is left to do', () => {
		const sent = (state: string, isDuplicate = false): Standing => ({
			step: 'sent',
			read: read(state, isDuplicate)
		});
		const items: Standing[] = [
			...Array.from({ length: 6 }, () => sent('understood')),
			sent('question'),
			sent('refused'),
			sent('kept', true),
			{ step: 'no-network', read: null }
		];
		expect(summaryWords(items)).toBe(
			'9 of 10 files sent. 6 are read. 1 asks a question. 1 cannot be read. 1 was here already. 1 waits for the network.'
		);
		expect(summaryWords([{ step: 'sending', read: null }])).toBe('0 of 1 file sent.');
	});
});
