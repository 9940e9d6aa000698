import { rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { arrivedDocket, sealedFor, signed } from '../../../../tests/helpers/sealed-docket';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { env } from '../env';
import { Certificate } from '../db/models/certificate';
import { Report } from '../db/models/report';
import { keepBytes } from '../storage/store';
import { testNow } from '../../../../tests/helpers/factories';
import { checkKeptReports } from './check-kept-reports';

useTestDatabase();

async function faults() {
	const found = [];
	for await (const { fault } of checkKeptReports()) found.push(fault);
	return found;
}

function pathOf(sha256: string): string {
	const { storage } = env();
	return storage.kind === 'folder' ? join(storage.folder, sha256.slice(0, 2), sha256) : '';
}

it('finds kept reports whole, and tells what happened to one that is not', async () => {
	const docket = await arrivedDocket();
	const first = await sealedFor(docket.ctx, docket.shipment.number, await signed(docket));
	const second = await sealedFor(docket.ctx, docket.shipment.number, await signed(docket));
	expect(await faults()).toEqual([null, null]);

	// A certificate that was replaced still vouches for what it sealed.
	await Certificate.update({ retiredAt: testNow }, { where: {} });
	expect(await faults()).toEqual([null, null]);

	const changed = Uint8Array.from(first.pdf);
	changed[2000] = (changed[2000] ?? 0) ^ 1;
	await writeFile(pathOf(first.sha256), changed);
	await rm(pathOf(second.sha256));
	expect((await faults()).toSorted()).toEqual(['missing', 'other-bytes']);
	await writeFile(pathOf(first.sha256), first.pdf);
	await writeFile(pathOf(second.sha256), second.pdf);

	// Whoever may write the rows too can name other bytes, but cannot seal them.
	const forged = await keepBytes(changed, 'application/pdf', testNow);
	const third = await signed(docket);
	await Report.create({ ...second.report.get(), id: third.id, dispositionId: third.id, fileId: forged.id });
	expect((await faults()).filter(Boolean)).toEqual(['changed']);
});
