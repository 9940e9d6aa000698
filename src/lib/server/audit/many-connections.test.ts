import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { multipart, exportText } from '../../../../tests/helpers/upload';
import {
	buildContact,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testPassword
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import type { Context } from '../context';
import { Arrival } from '../db/models/arrival';
import { AuditEntry } from '../db/models/audit-entry';
import { Disposition } from '../db/models/disposition';
import { LoggerRead } from '../db/models/logger-read';
import type { Site } from '../db/models/site';
import { evidenceSha256 } from '../dispositions/freeze';
import { signDisposition } from '../dispositions/sign-disposition';
import { getDocket } from '../dockets/get-docket';
import { addNote } from '../notes/add-note';
import { receiveUpload } from '../reads/receive-upload';
import { makeCheckpoint } from './checkpoint';
import { verifyAllChains } from './verify';

useTestDatabase();

async function arrivedLoad(site: Site, ctx: Context) {
	const load = await buildShipment({ site, arrivedAt: testNow });
	await buildContact(load.supplier);
	await Arrival.create({
		id: uuid(),
		shipmentId: load.shipment.id,
		arrivedAt: testNow,
		isSealIntact: true,
		loggedBy: ctx.actor.id,
		loggedAt: testNow
	});
	return load;
}

describe('many connections at once', () => {
	it('sign, upload and write notes on the same dockets, and no chain forks or deadlocks', async () => {
		const site = await buildSite();
		const qa = await contextFor(await buildUser(['qa'], { sites: [site] }));
		const second = await contextFor(await buildUser(['qa'], { sites: [site] }));
		const loads = [];
		for (let i = 0; i < 12; i++) loads.push(await arrivedLoad(site, qa));

		const work = loads.flatMap(({ shipment, lines }, nth) => {
			const sign = async (ctx: Context) =>
				signDisposition(ctx, shipment.number, {
					lines: lines.map(({ id }) => ({
						lineId: id,
						outcome: 'reject' as const,
						condition: null,
						reason: 'x'
					})),
					reasons: '',
					meaning: 'approval',
					password: testPassword,
					evidenceSha256: evidenceSha256(await getDocket(ctx, shipment.number)),
					amendmentReason: null,
					notify: true
				});
			const upload = async (celsius: number) => {
				const { body, contentType } = await multipart([
					{ name: `logger-${celsius}.csv`, content: exportText({ celsius, readings: 20 }) }
				]);
				return receiveUpload(qa, shipment.number, { body, contentType });
			};
			const note = (text: string) => addNote(qa, shipment.number, { id: uuid(), text });
			return [sign(qa), sign(second), upload(nth), note('a')];
		});
		const results = await Promise.allSettled([...work, makeCheckpoint(testNow), makeCheckpoint(testNow)]);

		// Whoever came too late is told so; nobody meets a deadlock, a lost connection or a bug.
		const codes = results.flatMap((result) => (result.status === 'rejected' ? [result.reason] : []));
		for (const reason of codes)
			expect(['changed-meanwhile', 'already-signed'], String(reason)).toContain(reason.code);
		expect(await AuditEntry.count({ where: { type: 'note.written' } })).toBe(
			results.filter((result, i) => i % 4 === 3 && i < work.length && result.status === 'fulfilled').length
		);
		expect(await AuditEntry.count({ where: { type: 'disposition.signed' } })).toBe(await Disposition.count());
		expect(await AuditEntry.count({ where: { type: 'read.received' } })).toBe(await LoggerRead.count());
		const { faults, unrecorded, checkpointFault } = await verifyAllChains();
		expect([faults, unrecorded, checkpointFault]).toEqual([[], [], null]);
	});
});
