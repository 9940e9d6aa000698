import type { InferAttributes } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testPassword
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { buildTrace } from '../../../../tests/helpers/trace-factory';
import type { Trace } from '../../domain/trace/trace';
import type { DispositionInput } from '../../schemas/disposition';
import { shipmentChange } from '../../schemas/shipment-form';
import { recordPulp } from '../arrivals/record-pulp';
import { reassess } from '../assessments/reassess';
import type { Context } from '../context';
import { Arrival } from '../db/models/arrival';
import type { Handover } from '../db/models/handover';
import { LineRecommendation } from '../db/models/line-recommendation';
import { inTransaction } from '../db/transaction';
import { evidenceSha256 } from '../dispositions/freeze';
import { signDisposition } from '../dispositions/sign-disposition';
import { getDocket } from '../dockets/get-docket';
import { withdrawRead } from '../reads/withdraw-read';
import { changeShipment } from '../shipments/change-shipment';
import { signingStanding } from './signing-standing';

useTestDatabase();

const from = Date.parse('2026-03-30T06:10:00Z');
const arrivedAt = new Date('2026-04-03T03:52:00Z');

/** 0 °C, and 25 °C in the last thirty hours before the door. */
function warmAtLast(warm = 180): Trace {
	const count = Math.round((arrivedAt.getTime() - from) / 600_000);
	return {
		unit: 'celsius',
		decimals: 1,
		times: Float64Array.from({ length: count }, (_, i) => from + i * 600_000),
		scaled: Int32Array.from({ length: count }, (_, i) => (i < count - warm ? 0 : 250))
	};
}

const declared = {
	...{ openingKind: 'declared', openingHours: '20', openingPlusMinusHours: '2' },
	openingBasis: 'harvest to pre-cool'
};

/** A handover as the form sends it. */
const asTyped = ({ plannedAt, actualAt, setPointCelsius, ...row }: InferAttributes<Handover>) => ({
	...{ id: row.id, partnerId: row.partnerId, holder: row.holder, place: row.place, source: row.source },
	...{ planned: plannedAt?.toISOString(), actual: actualAt?.toISOString() },
	setPointCelsius: String(setPointCelsius)
});

async function scene(trace = warmAtLast()) {
	const site = await buildSite();
	const made = await buildShipment({ site, arrivedAt });
	const { shipment, lines, handovers, supplier, carrier } = made;
	const person = async () => contextFor(await buildUser(['qa'], { sites: [site] }));
	const [qa, other] = [await person(), await person()];
	await Arrival.create({
		...{ id: uuid(), shipmentId: shipment.id, arrivedAt, isSealIntact: true },
		...{ loggedBy: other.actor.id, loggedAt: arrivedAt }
	});
	const { read, trip } = await buildTrace(shipment, await buildUser(['dock'], { sites: [site] }), trace);
	await inTransaction(qa, (w) => reassess(w, qa, shipment.id));

	/** Papers as they are, with the last handover at another time. */
	const change = async (ctx: Context, changes: object = {}) => {
		await shipment.reload();
		const papers = {
			version: shipment.version,
			supplierId: supplier.id,
			carrierId: carrier.id,
			due: '2026-04-03T05:30',
			reason: 'as on the waybill',
			lines: lines.map(({ id, productId, lot, casesAdvised, palletsAdvised }) => ({
				...{ id, productId, lot, cases: String(casesAdvised), pallets: String(palletsAdvised) },
				...declared
			})),
			loggers: [{ id: trip.id, serial: trip.serial, position: trip.position, placement: trip.placement }],
			handovers: handovers.map((row) => asTyped(row.get())),
			...changes
		};
		await changeShipment(ctx, shipment.number, shipmentChange.parse(papers));
	};
	const arrivedEarlier = (ctx: Context, actual = '2026-04-01T20:00:00Z') =>
		change(ctx, {
			handovers: handovers.map((row, at) =>
				asTyped({ ...row.get(), ...(at === handovers.length - 1 ? { actualAt: new Date(actual) } : {}) })
			)
		});
	const corrections = async () =>
		(await signingStanding(qa, await getDocket(qa, shipment.number))).corrections;
	const recommended = async () =>
		(await LineRecommendation.findOne({ where: { shipmentId: shipment.id } }))?.recommended;
	const sign = async (ctx: Context, meaning: 'approval' | 'review' = 'approval') => {
		const input: DispositionInput = {
			lines: [{ lineId: lines[0]?.id ?? '', outcome: 'reject', condition: null, reason: 'crushed' }],
			...{ reasons: 'Crushed.', meaning, password: testPassword, amendmentReason: null, notify: false },
			evidenceSha256: evidenceSha256(await getDocket(ctx, shipment.number))
		};
		return signDisposition(ctx, shipment.number, input);
	};
	return { ...made, qa, other, readId: read.id, change, arrivedEarlier, corrections, recommended, sign };
}

describe('a change of the handovers', () => {
	it('that moves the recommendation is kept with its maker and both figures', async () => {
		const { qa, arrivedEarlier, corrections, lines, recommended } = await scene();
		expect(await recommended()).toBe('reject');
		await arrivedEarlier(qa);
		expect(await recommended()).not.toBe('reject');
		const [move] = await corrections();
		expect(move).toMatchObject({ kind: 'handover', madeById: qa.actor.id, madeBy: qa.actor.name });
		const id = lines[0]?.id ?? '';
		expect(move?.before[id]?.recommended).toBe('reject');
		expect(move?.after[id]?.lowHours).toBeGreaterThan(move?.before[id]?.lowHours ?? Infinity);
	});

	it('is not its maker’s to judge by alone: another signs, or reviews first', async () => {
		const { qa, other, arrivedEarlier, sign } = await scene();
		await arrivedEarlier(qa);
		await expect(sign(qa)).rejects.toMatchObject({
			code: 'not-yet-yours',
			message: expect.stringContaining('Your own change of the handovers changed what is recommended.')
		});
		await sign(other, 'review');
		expect(await sign(qa)).toEqual({ version: 1 });
	});

	it('is signed by somebody else without more', async () => {
		const { qa, other, arrivedEarlier, sign } = await scene();
		await arrivedEarlier(qa);
		expect(await sign(other)).toEqual({ version: 1 });
	});

	it('that was put right again moved nothing', async () => {
		const { qa, arrivedEarlier, change, corrections, sign } = await scene();
		await arrivedEarlier(qa);
		await change(qa);
		expect(await corrections()).toEqual([]);
		expect(await sign(qa)).toEqual({ version: 1 });
	});

	it('that somebody else put right stands with both of them', async () => {
		const { qa, other, arrivedEarlier, change, corrections } = await scene();
		await arrivedEarlier(qa);
		await change(other);
		expect((await corrections()).map(({ madeById }) => madeById).sort()).toEqual(
			[qa.actor.id, other.actor.id].sort()
		);
	});

	it('that moves no recommendation needs nobody else', async () => {
		const { qa, arrivedEarlier, corrections, sign } = await scene();
		await arrivedEarlier(qa, '2026-04-03T03:40:00Z');
		expect(await corrections()).toEqual([]);
		expect(await sign(qa)).toEqual({ version: 1 });
	});
});

describe('other corrections', () => {
	it('of the papers count likewise', async () => {
		const { qa, change, corrections, lines } = await scene(warmAtLast(0));
		const line = {
			...{ id: lines[0]?.id, productId: lines[0]?.productId, lot: lines[0]?.lot },
			...{ cases: '960', pallets: '5', neededDays: '300' },
			...declared
		};
		await change(qa, { lines: [line] });
		expect(await corrections()).toMatchObject([{ kind: 'papers', madeById: qa.actor.id }]);
	});

	it('are reads withdrawn, when the recommendation rested on them', async () => {
		const { qa, readId, corrections, sign } = await scene();
		await withdrawRead(qa, readId, 'lay in the office');
		expect(await corrections()).toMatchObject([{ kind: 'read', madeById: qa.actor.id }]);
		await expect(sign(qa)).rejects.toThrow('Your own withdrawal of a read changed');
	});

	it('are pulp readings after the first: those are evidence, later ones correct it', async () => {
		const { qa, readId, corrections, lines, shipment, recommended } = await scene();
		await withdrawRead(qa, readId, 'another load’s');
		expect(await recommended()).toBe('hold');
		const pulp = (degrees: number) => [
			{
				...{ at: 0, degrees, lineId: lines[0]?.id ?? null, position: 'nose', caseLabel: null },
				...{ unit: 'celsius' as const, instrument: null, isMeant: null }
			}
		];
		const moves = async () => (await corrections()).filter(({ kind }) => kind === 'pulp');
		await recordPulp(qa, shipment.number, pulp(1));
		expect(await recommended()).toBe('accept');
		expect(await moves()).toEqual([]);
		await recordPulp(qa, shipment.number, pulp(25));
		expect(await recommended()).not.toBe('accept');
		expect(await moves()).toMatchObject([{ madeById: qa.actor.id }]);
	});
});
