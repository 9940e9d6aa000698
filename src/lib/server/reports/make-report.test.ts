import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { arrivedDocket, signed, type ArrivedDocket } from '../../../../tests/helpers/sealed-docket';
import { pdfsig } from '../../../../tests/helpers/pdf-tools';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { startTimestampAuthority } from '../../../../tests/helpers/timestamp-authority';
import { verifyAllChains } from '../audit/verify';
import { systemContext } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import type { Disposition } from '../db/models/disposition';
import { Report } from '../db/models/report';
import { StoredFile } from '../db/models/stored-file';
import { fileStore } from '../storage/store';
import { checkKeptReports } from './check-kept-reports';
import { ensureReport } from './make-report';

useTestDatabase();
// Before anything reads the settings: an authority on loopback, which stands in for a real one.
const authority = await startTimestampAuthority();
process.env.TIMESTAMP_URL = authority.url;
afterAll(() => authority.stop());

let docket: ArrivedDocket;
let disposition: Disposition;

beforeEach(async () => {
	docket = await arrivedDocket();
	disposition = await signed(docket);
	authority.manner = 'answers';
});

const now = new Date('2026-04-03T09:00:00Z');
const make = () => ensureReport(systemContext(now), disposition.id);

async function sealedEntry() {
	const where = { chainId: docket.shipment.id, type: 'report.sealed' };
	const entry = await AuditEntry.findOne({ where, rejectOnEmpty: true });
	const { text } = await AuditPayload.findByPk(entry.id, { rejectOnEmpty: true });
	return JSON.parse(text ?? '');
}

async function keptCheck(reportId: string) {
	for await (const kept of checkKeptReports()) if (kept.reportId === reportId) return kept;
	return null;
}

describe('a report made with a timestamp authority', () => {
	it('is kept with the timestamp in its seal, and the trail says by whom and when', async () => {
		const report = await make();
		const file = await StoredFile.findByPk(report.fileId, { rejectOnEmpty: true });
		const pdf = await (await fileStore()).read(file.sha256);
		expect(pdfsig(pdf)).toContain('Signature is Valid.');
		const entry = await sealedEntry();
		expect(entry).toMatchObject({
			reportId: report.id,
			fileSha256: file.sha256,
			bytes: pdf.byteLength,
			timestamp: { state: 'stamped', authority: new URL(authority.url).host }
		});
		expect(await keptCheck(report.id)).toMatchObject({ fault: null, timestampAt: entry.timestamp.at });
		expect((await verifyAllChains()).faults).toEqual([]);
	});

	it('is made once: asked for again it is the same, and no authority is asked again', async () => {
		const first = await make();
		const asked = authority.asked();
		expect((await make()).id).toBe(first.id);
		expect(authority.asked()).toBe(asked);
		expect(await Report.count({ where: { dispositionId: disposition.id } })).toBe(1);
	});

	it('made by two workers at once is one report, sealed once in the trail', async () => {
		const [one, other] = await Promise.all([make(), make()]);
		expect(one.id).toBe(other.id);
		const where = { chainId: docket.shipment.id, type: 'report.sealed' };
		expect(await AuditEntry.count({ where })).toBe(1);
	});

	it('is kept without one where the authority fails, valid all the same, and the trail says why', async () => {
		authority.manner = 'fails';
		const report = await make();
		expect(await sealedEntry()).toMatchObject({
			timestamp: { state: 'failed', why: expect.stringContaining('503') }
		});
		expect(await keptCheck(report.id)).toMatchObject({ fault: null, timestampAt: null });
	});
});
