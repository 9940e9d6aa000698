import { describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { multipart } from '../../../../tests/helpers/upload';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import type { Context } from '../context';
import { linesOfRuns } from '../../domain/ingest/line-runs';
import { TraceRow } from '../db/models/trace-row';
import { getFileLines, getReadingLine } from './get-file-lines';
import { getTraceLines } from './get-trace-lines';
import { keepRead } from './keep-read';
import { receiveUpload } from './receive-upload';

useTestDatabase();

async function scene() {
	const site = await buildSite();
	const at = async (role: 'dock' | 'qa' | 'claims') => contextFor(await buildUser([role], { sites: [site] }));
	const made = await buildShipment({ site });
	const outside = await contextFor(await buildUser(['supplier'], { partner: made.supplier }));
	const stranger = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
	return { ...made, dock: await at('dock'), claims: await at('claims'), outside, stranger };
}

async function upload(ctx: Context, number: string, content: string): Promise<string> {
	const { body, contentType } = await multipart([{ name: 'trip.csv', content }]);
	return (await receiveUpload(ctx, number, { body, contentType })).reads[0]?.id ?? '';
}

const header = ['Serial;WH-1', '', 'Time;Temp °C'];
const row = (i: number) =>
	`${new Date(Date.UTC(2026, 2, 30, 6, 10) + i * 600_000).toISOString().slice(0, 19)}Z;${(i % 50) / 10 + 1}`;
/** Newest first, as some loggers write. */
const rows = Array.from({ length: 200 }, (_, i) => row(199 - i));
const content = [...header, ...rows, ''].join('\n');
const serial = { lineId: null, position: null, placement: 'between-cases', accuracyCelsius: 0.5 } as const;

describe('the original text of a reading', () => {
	it('is the line of the file it was made of, for staff of the site alone', async () => {
		const { dock, claims, outside, stranger, shipment } = await scene();
		const readId = await upload(dock, shipment.number, content);
		await keepRead(dock, readId, { ...serial, serial: 'WH-TEXT-1' });
		const trace = await TraceRow.findOne({ where: { readId } });
		const id = trace?.id ?? '';
		const at = '2026-03-30T06:20:00Z';
		for (const who of [dock, claims])
			expect(await getReadingLine(who, id, { at })).toEqual({
				fileName: 'trip.csv',
				line: 202,
				text: row(1),
				isCut: false
			});
		await expect(getReadingLine(outside, id, { at })).rejects.toMatchObject({ code: 'not-allowed' });
		await expect(getReadingLine(stranger, id, { at })).rejects.toMatchObject({ code: 'not-found' });
		const between = getReadingLine(dock, id, { at: '2026-03-30T06:20:01Z' });
		await expect(between).rejects.toMatchObject({ code: 'not-found' });
	});

	it('is found by the corrected time where the logger’s clock was corrected', async () => {
		const { dock, shipment } = await scene();
		const readId = await upload(dock, shipment.number, content);
		await keepRead(dock, readId, { ...serial, serial: 'WH-TEXT-2' });
		const trace = await TraceRow.findOne({ where: { readId } });
		await trace?.update({ clockShiftMs: -3_600_000 });
		const line = await getReadingLine(dock, trace?.id ?? '', { at: '2026-03-30T05:20:00Z' });
		expect(line.text).toBe(row(1));
		const { lines, clockShiftMs } = await getFileLines(dock, readId, 202);
		expect(clockShiftMs).toBe(-3_600_000);
		expect(lines[0]).toMatchObject({ line: 202, atMs: Date.UTC(2026, 2, 30, 5, 20) });
	});

	it('is numbered for all readings at once, in order of time, for staff of the site alone', async () => {
		const { dock, outside, stranger, shipment } = await scene();
		// The third reading from the end stands twice: the repeat on line 7 is dropped.
		const rowsTwice = [...rows.slice(0, 3), rows[2], ...rows.slice(3)];
		const readId = await upload(dock, shipment.number, [...header, ...rowsTwice, ''].join('\n'));
		await keepRead(dock, readId, { ...serial, serial: 'WH-TEXT-3' });
		const trace = await TraceRow.findOne({ where: { readId } });
		const id = trace?.id ?? '';
		const { fileName, runs } = await getTraceLines(dock, id);
		expect(fileName).toBe('trip.csv');
		const numbers = [...linesOfRuns(runs)];
		expect(numbers).toHaveLength(trace?.readings ?? 0);
		expect(numbers.slice(0, 2)).toEqual([204, 203]);
		expect(numbers.slice(-2)).toEqual([5, 4]);
		expect(numbers.filter((line) => line === 6 || line === 7)).toHaveLength(1);
		await expect(getTraceLines(outside, id)).rejects.toMatchObject({ code: 'not-allowed' });
		await expect(getTraceLines(stranger, id)).rejects.toMatchObject({ code: 'not-found' });

		await trace?.update({ readings: 7 });
		expect((await getTraceLines(dock, id)).runs).toEqual([]);
	});

	it('stands beside what was read of it, a page at a time', async () => {
		const { dock, outside, stranger, shipment } = await scene();
		const readId = await upload(dock, shipment.number, content);
		const first = await getFileLines(dock, readId, 1);
		expect(first).toMatchObject({ total: 203, fileName: 'trip.csv', clockShiftMs: 0 });
		expect(first.lines).toHaveLength(60);
		expect(first.lines[0]).toEqual({ line: 1, text: 'Serial;WH-1', isCut: false, atMs: null, celsius: null });
		expect(first.lines[3]).toMatchObject({
			text: row(199),
			celsius: 5.9,
			atMs: Date.UTC(2026, 2, 31, 15, 20)
		});
		expect((await getFileLines(dock, readId, 200)).lines.map(({ line }) => line)).toEqual([
			200, 201, 202, 203
		]);
		expect((await getFileLines(dock, readId, 5000)).lines).toEqual([]);
		await expect(getFileLines(outside, readId, 1)).rejects.toMatchObject({ code: 'not-allowed' });
		await expect(getFileLines(stranger, readId, 1)).rejects.toMatchObject({ code: 'not-found' });
	});

	it('is none of a file that is no text, and shown of one that asks or is refused', async () => {
		const { dock, shipment } = await scene();
		const pdf = await upload(dock, shipment.number, '%PDF-1.7 x');
		expect(await getFileLines(dock, pdf, 1)).toMatchObject({ total: null, lines: [] });
		const words = await upload(dock, shipment.number, 'no readings here\nat all\n');
		expect((await getFileLines(dock, words, 1)).lines.map(({ text }) => text)).toEqual([
			'no readings here',
			'at all'
		]);
	});
});
