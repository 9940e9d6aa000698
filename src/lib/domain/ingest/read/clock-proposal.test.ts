import { describe, expect, it } from 'vitest';
import type { ReadContext } from '../ingestion';
import { readExport } from '../read-export';
import { proposeClock } from './clock-proposal';

const minute = 60_000;
const hour = 60 * minute;
const arrivalMs = Date.UTC(2026, 3, 20, 9, 30);
const uploadedMs = Date.UTC(2026, 3, 20, 10, 10);
const context = (more: Partial<ReadContext> = {}): ReadContext => ({
	uploadedMs,
	siteZone: 'Europe/Berlin',
	journeyFromMs: null,
	journeyToMs: arrivalMs,
	answers: {},
	...more
});
const propose = (lastMs: number, usualIntervalMs = 10 * minute, more: Partial<ReadContext> = {}) =>
	proposeClock({ lastMs, usualIntervalMs }, context(more));

describe('the last reading held against arrival and upload', () => {
	it.each([
		['at the arrival', arrivalMs],
		['one interval before it', arrivalMs - 10 * minute],
		['between arrival and upload', arrivalMs + 20 * minute],
		['a few minutes after the upload', uploadedMs + 4 * minute]
	])('proposes nothing %s', (_, lastMs) => {
		expect(propose(lastMs)).toBeNull();
	});

	it.each([
		['two hours after the arrival', arrivalMs + 2 * hour, -2, 'after-arrival'],
		['two hours and four minutes after it', arrivalMs + 2 * hour + 4 * minute, -2, 'after-arrival'],
		['one reading short of two hours after it', arrivalMs + 2 * hour - 10 * minute, -2, 'after-arrival'],
		['nine hours after the arrival', arrivalMs + 9 * hour, -9, 'after-arrival'],
		['one hour after the upload', uploadedMs + hour, -1, 'after-upload'],
		['one hour before the arrival', arrivalMs - hour, 1, 'before-arrival'],
		['seven hours and a reading before it', arrivalMs - 7 * hour - 10 * minute, 7, 'before-arrival']
	])('proposes a zone %s', (_, lastMs, hours, evidence) => {
		expect(propose(lastMs)).toEqual({ kind: 'zone', hours, shiftMs: hours * hour, evidence });
	});

	it.each([
		['after the upload', uploadedMs + 33 * minute, -33 * minute, 'after-upload'],
		[
			'by days after the upload',
			uploadedMs + 40 * hour + 25 * minute,
			-(40 * hour + 25 * minute),
			'after-upload'
		],
		['before the arrival', arrivalMs - 2 * hour - 31 * minute, 2 * hour + 31 * minute, 'before-arrival']
	])('proposes a drift %s by no whole hours', (_, lastMs, shiftMs, evidence) => {
		expect(propose(lastMs)).toEqual({ kind: 'drift', hours: null, shiftMs, evidence });
	});

	it('takes a logger that ended a day early for one that stopped', () => {
		expect(propose(arrivalMs - 26 * hour - 31 * minute)).toBeNull();
	});

	it('says nothing of an earlier end where no arrival is known', () => {
		expect(propose(uploadedMs - 5 * hour, 10 * minute, { journeyToMs: null })).toBeNull();
	});

	it('does not take an hourly log for an hour off', () => {
		expect(propose(arrivalMs - 50 * minute, hour)).toBeNull();
	});

	it('stands in what is understood of a file, and changes no reading', () => {
		const rows = ['11:10', '11:20', '11:30'].map((clock) => `2026-04-20T${clock}:00Z,4.5`).join('\n');
		const bytes = new TextEncoder().encode(`time,celsius\n${rows}\n`);
		expect(readExport(bytes, context())).toMatchObject({
			kind: 'ok',
			understanding: {
				lastMs: Date.UTC(2026, 3, 20, 11, 30),
				clockProposal: { kind: 'zone', hours: -2, evidence: 'after-arrival' }
			}
		});
	});
});
