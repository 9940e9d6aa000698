import { buffer } from 'node:stream/consumers';
import { unzipSync } from 'fflate';
import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { claimChange, claimListQuery, claimOpening, minorUnitsOf } from '../../schemas/claim';
import { AuditEntry } from '../db/models/audit-entry';
import { Certificate } from '../db/models/certificate';
import { Disposition } from '../db/models/disposition';
import { DispositionLine } from '../db/models/disposition-line';
import { Report } from '../db/models/report';
import { sha256Hex } from '../storage/sha256';
import { keepBytes } from '../storage/store';
import { changeClaim } from './change-claim';
import { takeEvidenceBundle } from './evidence-bundle';
import { getClaim } from './get-claim';
import { listClaims } from './list-claims';
import { openClaim } from './open-claim';

useTestDatabase();

/** A load QA refused, with its signed report on file. */
async function refusedLoad() {
	const site = await buildSite();
	const load = await buildShipment({ site, arrivedAt: testNow, decidedAt: testNow, verdict: 'rejected' });
	const qa = await buildUser(['qa'], { sites: [site] });
	const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
	const dispositionId = uuid();
	await Disposition.create({
		id: dispositionId,
		shipmentId: load.shipment.id,
		version: 1,
		verdict: 'rejected',
		reasons: 'warm',
		amendmentReason: null,
		meaning: 'approval',
		signedBy: qa.id,
		signedName: qa.name,
		signedTitle: 'QA',
		signedAt: testNow,
		zone: site.zone,
		frozen: '{}',
		frozenSha256: sha256Hex('{}')
	});
	await DispositionLine.create({
		id: uuid(),
		dispositionId,
		lineId: load.lines[0]?.id ?? '',
		outcome: 'reject',
		cases: 960,
		pallets: 5,
		reason: 'Warm'
	});
	const certificateId = uuid();
	await Certificate.create({
		id: certificateId,
		organisationId: site.organisationId,
		subject: 'CN=test',
		serial: '1',
		sha256: sha256Hex(certificateId),
		pem: '',
		validFrom: testNow,
		validUntil: testNow,
		createdAt: testNow
	});
	const pdf = Buffer.from(`%PDF-1.7 of ${load.shipment.number}`);
	const file = await keepBytes(pdf, 'application/pdf', testNow);
	await Report.create({
		id: uuid(),
		dispositionId,
		shipmentId: load.shipment.id,
		fileId: file.id,
		fileName: `${load.shipment.number}-v1.pdf`,
		certificateId,
		madeAt: testNow
	});
	return { ...load, site, claims, pdf, number: load.shipment.number };
}

const opening = (docket: string) => claimOpening.parse({ docket, currency: 'EUR', amount: '9,769.00' });

describe('the claims list', () => {
	it('shows a refused load to claims of its site before anybody opened a claim', async () => {
		const load = await refusedLoad();
		const { items } = await listClaims(load.claims, claimListQuery.parse({}));
		expect(items).toMatchObject([
			{ docketNumber: load.number, casesRefused: 960, claim: null, verdict: 'rejected' }
		]);
	});

	it('shows nothing of other sites, and refuses the dock', async () => {
		const load = await refusedLoad();
		const elsewhere = await contextFor(await buildUser(['claims'], { sites: [await buildSite()] }));
		expect(await listClaims(elsewhere, claimListQuery.parse({}))).toEqual({ items: [], total: 0 });
		const dock = await contextFor(await buildUser(['dock'], { sites: [load.site] }));
		await expect(listClaims(dock, claimListQuery.parse({}))).rejects.toMatchObject({ code: 'not-allowed' });
	});
});

describe('a claim', () => {
	it('is opened once on a docket, by claims only, with its audit entry', async () => {
		const load = await refusedLoad();
		const qa = await contextFor(await buildUser(['qa'], { sites: [load.site] }));
		await expect(openClaim(qa, opening(load.number))).rejects.toMatchObject({ code: 'not-allowed' });
		const { id } = await openClaim(load.claims, opening(load.number));
		expect((await getClaim(load.claims, id)).claim).toMatchObject({
			amountMinor: 976_900,
			currency: 'EUR',
			status: 'open'
		});
		await expect(openClaim(load.claims, opening(load.number))).rejects.toMatchObject({ code: 'duplicate' });
		expect(await AuditEntry.count({ where: { chainId: load.shipment.id, type: 'claim.opened' } })).toBe(1);
	});

	it('is not overwritten by somebody who looked at an older one', async () => {
		const load = await refusedLoad();
		const { id } = await openClaim(load.claims, opening(load.number));
		const change = claimChange.parse({ currency: 'EUR', amount: '100', status: 'filed', version: 0 });
		await changeClaim(load.claims, id, change);
		await expect(changeClaim(load.claims, id, change)).rejects.toMatchObject({ code: 'changed-meanwhile' });
		expect((await getClaim(load.claims, id)).claim).toMatchObject({
			status: 'filed',
			amountMinor: 10_000,
			version: 1
		});
	});
});

describe('the evidence bundle', () => {
	it('holds the report and a manifest whose hashes are those of its files, and goes on the record', async () => {
		const load = await refusedLoad();
		const { fileName, stream } = await takeEvidenceBundle(load.claims, load.number);
		expect(fileName).toBe(`${load.number}-evidence.zip`);
		const files = unzipSync(new Uint8Array(await buffer(stream)));
		const manifest = JSON.parse(Buffer.from(files['manifest.json'] ?? []).toString());
		expect(manifest.files).toHaveLength(1);
		for (const { file, sha256 } of manifest.files)
			expect(sha256Hex(files[file] ?? new Uint8Array())).toBe(sha256);
		expect(Buffer.from(files[`${load.number}-v1.pdf`] ?? [])).toEqual(load.pdf);
		expect(await AuditEntry.count({ where: { chainId: load.shipment.id, type: 'evidence.taken' } })).toBe(1);
	});

	it('is not for a docket nobody signed, nor for the dock', async () => {
		const { shipment, site } = await buildShipment();
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		await expect(takeEvidenceBundle(claims, shipment.number)).rejects.toMatchObject({ code: 'not-signed' });
		const dock = await contextFor(await buildUser(['dock'], { sites: [site] }));
		await expect(takeEvidenceBundle(dock, shipment.number)).rejects.toMatchObject({ code: 'not-allowed' });
	});
});

describe('an amount as typed', () => {
	it('is read in the minor units of its currency', () => {
		expect(minorUnitsOf('9,769.00', 'EUR')).toBe(976_900);
		expect(minorUnitsOf('9.769,5', 'EUR')).toBe(976_950);
		expect(minorUnitsOf('9769', 'JPY')).toBe(9769);
		expect(minorUnitsOf('1.234', 'KWD')).toBe(1234);
		expect(minorUnitsOf('9769.005', 'EUR')).toBeNull();
		expect(minorUnitsOf('much', 'EUR')).toBeNull();
	});
});
