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
import { arrivalInput, pulpInput } from '../../schemas/arrival';
import type { Role } from '../context';
import { Arrival } from '../db/models/arrival';
import { AuditEntry } from '../db/models/audit-entry';
import { Clock } from '../db/models/clock';
import { Handover } from '../db/models/handover';
import { LineRecommendation } from '../db/models/line-recommendation';
import { PulpReading } from '../db/models/pulp-reading';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { StoredFile } from '../db/models/stored-file';
import { logArrival } from './log-arrival';
import { recordPulp } from './record-pulp';

useTestDatabase();

const png = `data:image/png;base64,iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNkYPhfDwAChwGA60e6kgAAAABJRU5ErkJggg==`;

async function setUp(overrides: Parameters<typeof buildShipment>[0] = {}, role: Role = 'dock') {
	const built = await buildShipment(overrides);
	const ctx = await contextFor(await buildUser([role], { sites: [built.site] }));
	const line = built.lines[0]?.id ?? '';
	const seen = {
		arrived: '2026-04-03T05:52',
		dock: 'Dock 1',
		seal: 'as-on-papers',
		setPointDegrees: '33.8',
		returnAirDegrees: '35.6',
		unit: 'fahrenheit',
		counts: [{ lineId: line, received: '958' }],
		pulp: [{ lineId: line, position: 'nose', degrees: '1,6', instrument: 'P-4' }, { degrees: '' }],
		driverName: 'Teun Brakel',
		driverSignature: png
	};
	const make = (changes: object = {}) => arrivalInput.parse({ ...seen, ...changes });
	return { ...built, ctx, make, number: built.shipment.number, where: { shipmentId: built.shipment.id } };
}

describe('logging an arrival', () => {
	it.each(['claims', 'admin'] as const)('is not for the role %s', async (role) => {
		const { ctx, number, make } = await setUp({}, role);
		await expect(logArrival(ctx, number, make())).rejects.toMatchObject({ code: 'not-allowed' });
	});

	it('is hidden from other sites and not for suppliers', async () => {
		const { number, make, supplier } = await setUp();
		const elsewhere = await contextFor(await buildUser(['dock'], { sites: [await buildSite()] }));
		await expect(logArrival(elsewhere, number, make())).rejects.toMatchObject({ code: 'not-found' });
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(logArrival(own, number, make())).rejects.toMatchObject({ code: 'not-allowed' });
	});

	it('keeps what was seen, starts the clock, and says what is now to be said of the goods', async () => {
		const { ctx, number, make, where, shipment } = await setUp();
		await Handover.update({ actualAt: null }, { where: { ...where, ordinal: 3 } });
		await logArrival(ctx, number, make());

		const at = new Date('2026-04-03T03:52:00Z');
		const arrival = await Arrival.findOne({ where });
		expect(arrival).toMatchObject({
			...{ arrivedAt: at, sealFound: '0093187', isSealIntact: true, driverName: 'Teun Brakel' },
			loggedBy: ctx.actor.id
		});
		expect(arrival?.setPointCelsius).toBeCloseTo(1, 10);
		expect(arrival?.returnAirCelsius).toBeCloseTo(2, 10);
		expect(await StoredFile.findByPk(arrival?.driverSignatureId ?? '')).toMatchObject({
			mediaType: 'image/png'
		});
		expect(await Shipment.findByPk(shipment.id)).toMatchObject({ arrivedAt: at, dock: 'Dock 1', version: 1 });
		expect((await ShipmentLine.findOne({ where }))?.casesReceived).toBe(958);
		expect(await PulpReading.findAll({ where })).toMatchObject([
			{ degrees: 1.6, unit: 'celsius', position: 'nose', instrument: 'P-4', takenBy: ctx.actor.id }
		]);
		expect((await Handover.findOne({ where: { ...where, ordinal: 3 } }))?.actualAt).toEqual(at);
		expect(await Clock.findOne({ where })).toMatchObject({
			...{ name: 'Reject the goods', basis: 'Supply terms § 6, from arrival', startsAt: at },
			deadlineAt: new Date('2026-04-03T11:52:00Z')
		});
		expect(await LineRecommendation.count({ where })).toBe(1);
		const entries = await AuditEntry.findAll({ where: { chainId: shipment.id }, order: ['seq'] });
		expect(entries.map((entry) => entry.type)).toEqual([
			'arrival.logged',
			'pulp.recorded',
			'assessment.made'
		]);
	});

	it('leaves a handover time that somebody wrote down, and starts no clock without a term', async () => {
		const { ctx, number, make, where } = await setUp({ rejectWithinHours: null });
		await logArrival(ctx, number, make());
		expect((await Handover.findOne({ where: { ...where, ordinal: 3 } }))?.actualAt).toEqual(
			new Date('2026-04-03T03:30:00Z')
		);
		expect(await Clock.count({ where })).toBe(0);
	});

	it.each([
		['other', '0099', { sealFound: '0099', isSealIntact: true }],
		['broken', '', { sealFound: '0093187', isSealIntact: false }],
		['none', '', { sealFound: null, isSealIntact: false }]
	])('keeps a seal that is %s', async (seal, sealFound, kept) => {
		const { ctx, number, make, where } = await setUp();
		await logArrival(ctx, number, make({ seal, sealFound }));
		expect(await Arrival.findOne({ where })).toMatchObject(kept);
	});

	it('logs one arrival when it is sent twice, and refuses a second one', async () => {
		const { ctx, number, make, where } = await setUp();
		const id = uuid();
		await Promise.all([logArrival(ctx, number, make({ id })), logArrival(ctx, number, make({ id }))]);
		expect(await PulpReading.count({ where })).toBe(1);
		await expect(logArrival(ctx, number, make())).rejects.toMatchObject({ code: 'already-arrived' });
	});

	it('says what cannot be and writes nothing of it', async () => {
		const { ctx, number, make, where } = await setUp();
		const other = await setUp();
		const strange = other.lines[0]?.id;
		const input = make({
			arrived: '2026-04-03T23:00',
			counts: [{ lineId: strange, received: '1' }],
			pulp: [{ lineId: strange, degrees: '2' }]
		});
		await expect(logArrival(ctx, number, input)).rejects.toMatchObject({
			issues: {
				arrived: 'That time is still to come.',
				'counts.0.received': expect.any(String),
				'pulp.0.lineId': expect.any(String)
			}
		});
		await expect(
			logArrival(ctx, number, make({ driverSignature: 'data:image/svg+xml;base64,PHN2Zy8+' }))
		).rejects.toMatchObject({ issues: { driverSignature: expect.any(String) } });
		expect(await Arrival.count({ where })).toBe(0);
	});

	it('is refused on a signed or cancelled docket', async () => {
		const signed = await setUp({ decidedAt: testNow, verdict: 'accepted' });
		await expect(logArrival(signed.ctx, signed.number, signed.make())).rejects.toMatchObject({
			code: 'already-signed'
		});
		const cancelled = await setUp({ cancelledAt: testNow });
		await expect(logArrival(cancelled.ctx, cancelled.number, cancelled.make())).rejects.toMatchObject({
			code: 'cancelled'
		});
	});
});

describe('recording pulp later', () => {
	const pulp = pulpInput.parse({ pulp: [{ position: 'tail', degrees: '41', unit: 'fahrenheit' }] }).pulp;

	it('needs the load to be here', async () => {
		const { ctx, number } = await setUp();
		await expect(recordPulp(ctx, number, pulp)).rejects.toMatchObject({ code: 'not-arrived' });
	});

	it('keeps the figure as written and works out again', async () => {
		const { ctx, number, where, shipment } = await setUp({ arrivedAt: testNow });
		await recordPulp(ctx, number, pulp);
		expect(await PulpReading.findOne({ where })).toMatchObject({ degrees: 41, unit: 'fahrenheit' });
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'pulp.recorded' } })).toBe(1);
	});

	it('is not for claims, other sites or lines of other dockets', async () => {
		const { number, site, ctx } = await setUp({ arrivedAt: testNow });
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		await expect(recordPulp(claims, number, pulp)).rejects.toMatchObject({ code: 'not-allowed' });
		const elsewhere = await contextFor(await buildUser(['dock'], { sites: [await buildSite()] }));
		await expect(recordPulp(elsewhere, number, pulp)).rejects.toMatchObject({ code: 'not-found' });
		const strange = pulp.map((row) => ({ ...row, lineId: uuid() }));
		await expect(recordPulp(ctx, number, strange)).rejects.toMatchObject({ code: 'invalid' });
	});
});
