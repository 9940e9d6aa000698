import { describe, expect, it } from 'vitest';
import { buildShipment, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { buildTrace, steadyTrace } from '../../../../tests/helpers/trace-factory';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { shipmentChange, shipmentInput } from '../../schemas/shipment-form';
import { AssessmentRow } from '../db/models/assessment-row';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { LoggerTrip } from '../db/models/logger-trip';
import { ShipmentLine } from '../db/models/shipment-line';
import { changeShipment } from './change-shipment';
import { listCompartments } from './compartments';
import { createShipment } from './create-shipment';
import { getPapersForm } from './get-papers-form';

useTestDatabase();

interface Row extends Record<string, unknown> {
	compartment: string | null;
}

/** A load at the door with two lines and a logger for each half of the trailer, neither with a line of its own. */
async function twoHalves() {
	const made = await buildShipment({ arrivedAt: new Date('2026-04-03T03:52:00Z'), lines: [{}, {}] });
	const { shipment, site } = made;
	const qa = await buildUser(['qa'], { sites: [site] });
	const [from, to] = ['2026-03-30T06:10:00Z', '2026-04-03T03:30:00Z'];
	const cold = await buildTrace(shipment, qa, steadyTrace(0, from, to, 5));
	const warm = await buildTrace(shipment, qa, steadyTrace(3, from, to, 5));
	const ctx = await contextFor(qa);
	const papers = async () => {
		const { values } = await getPapersForm(ctx, shipment.number);
		return values as { lines: Row[]; loggers: Row[] };
	};
	/** Writes the names beside lines and loggers, in their order, and saves the papers. */
	const save = async (lines: readonly string[], loggers: readonly string[], more: object = {}) => {
		const values = await papers();
		const named = (rows: Row[], names: readonly string[]) =>
			rows.map((row, at) => ({ ...row, compartment: names[at] ?? '' }));
		const sent = { ...values, lines: named(values.lines, lines), loggers: named(values.loggers, loggers) };
		return changeShipment(ctx, shipment.number, shipmentChange.parse({ ...sent, ...more }));
	};
	const judgedBy = async (at: number) => {
		const where = { lineId: made.lines[at]?.id, isCurrent: true };
		return (await AssessmentRow.findAll({ where })).map(({ traceId }) => traceId).sort();
	};
	return { ...made, ctx, papers, save, judgedBy, cold: cold.row.id, warm: warm.row.id };
}

describe('compartments that papers name', () => {
	it('give each line the loggers of its own, and never those of another', async () => {
		const { save, judgedBy, cold, warm } = await twoHalves();
		await save([], []);
		expect([await judgedBy(0), await judgedBy(1)]).toEqual([[cold, warm].sort(), [cold, warm].sort()]);
		await save(['front', 'rear'], ['front', 'rear']);
		expect([await judgedBy(0), await judgedBy(1)]).toEqual([[cold], [warm]]);
		// Without a name, a logger speaks for lines without one: not for the front, and not for the rear.
		await save(['front', ''], ['front', '']);
		expect([await judgedBy(0), await judgedBy(1)]).toEqual([[cold], [warm]]);
		await save(['front', 'rear'], ['front', '']);
		expect([await judgedBy(0), await judgedBy(1)]).toEqual([[cold], []]);
		await save([], []);
		expect(await judgedBy(1)).toEqual([cold, warm].sort());
	});

	it('are one where they have one name, however it is typed, and another docket’s are others', async () => {
		const { save, shipment, lines, judgedBy, cold, warm } = await twoHalves();
		await save(['Front', ' front '], ['FRONT', 'front']);
		expect((await listCompartments(shipment)).map(({ name }) => name)).toEqual(['Front']);
		expect(await judgedBy(1)).toEqual([cold, warm].sort());
		const ids = (await ShipmentLine.findAll({ where: { id: lines.map(({ id }) => id) } })).map(
			({ compartmentId }) => compartmentId
		);
		expect(new Set(ids).size).toBe(1);
		const other = await twoHalves();
		await other.save(['Front'], []);
		expect((await listCompartments(other.shipment))[0]?.id).not.toBe(ids[0]);
	});

	it('come back in the form as they were typed, and a second save changes nothing', async () => {
		const { save, papers, ctx, shipment } = await twoHalves();
		await save(['front', ''], ['', 'rear']);
		const names = async () => {
			const { lines, loggers } = await papers();
			return [lines, loggers].map((rows) => rows.map(({ compartment }) => compartment));
		};
		expect(await names()).toEqual([
			['front', null],
			[null, 'rear']
		]);
		await changeShipment(ctx, shipment.number, shipmentChange.parse(await papers()));
		expect(await names()).toEqual([
			['front', null],
			[null, 'rear']
		]);
		expect(await listCompartments(shipment)).toHaveLength(2);
	});

	it('stand by name on the record', async () => {
		const { save, shipment } = await twoHalves();
		await save(['front'], []);
		const entry = await AuditEntry.findOne({ where: { chainId: shipment.id, type: 'shipment.changed' } });
		expect(JSON.parse((await AuditPayload.findByPk(entry?.id))?.text ?? '{}')).toMatchObject({
			before: { compartments: [], lines: [{ compartmentId: null }, {}] },
			after: { compartments: [{ name: 'front' }], lines: [{ compartmentId: expect.any(String) }, {}] }
		});
	});

	it('are refused where a logger rides with a line that is elsewhere, or a name is too long', async () => {
		const { save, papers } = await twoHalves();
		const loggers = (await papers()).loggers.map((row) => ({ ...row, line: 1, compartment: 'rear' }));
		const elsewhere = save(['front'], [], { loggers });
		await expect(elsewhere).rejects.toMatchObject({
			issues: { 'loggers.0.compartment': 'Line 1 rides in front.' }
		});
		const none = save([], [], { loggers });
		await expect(none).rejects.toMatchObject({
			issues: { 'loggers.0.compartment': 'Line 1 rides in no compartment.' }
		});
		await save(['Rear'], [], { loggers });
		const long = shipmentInput.safeParse({ lines: [{ compartment: 'x'.repeat(41) }] });
		expect(long.error?.issues.map(({ path }) => path.join('.'))).toContain('lines.0.compartment');
	});

	it('are there from the first papers on', async () => {
		const { ctx, site, supplier, lines } = await twoHalves();
		const line = (compartment: string) => ({
			productId: lines[0]?.productId,
			lot: `OB-${compartment}`,
			cases: '10',
			compartment
		});
		const input = shipmentInput.parse({
			supplierId: supplier.id,
			due: '2026-04-04T05:30',
			lines: [line('front'), line('rear')],
			loggers: [{ serial: 'WH-REAR', compartment: 'rear' }]
		});
		const { id } = await createShipment(ctx, site.id, input);
		const [front, rear] = await listCompartments({ id, visitId: null });
		const found = await ShipmentLine.findAll({ where: { shipmentId: id }, order: ['ordinal'] });
		expect(found.map(({ compartmentId }) => compartmentId)).toEqual([front?.id, rear?.id]);
		expect(await LoggerTrip.findOne({ where: { shipmentId: id } })).toMatchObject({
			compartmentId: rear?.id
		});
	});
});
