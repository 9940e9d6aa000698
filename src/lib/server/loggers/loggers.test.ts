import { describe, expect, it } from 'vitest';
import { buildPartner, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { calibrationForm, loggerForm, loggerQuery } from '../../schemas/logger';
import type { Context, Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { getLogger } from './get-logger';
import { listLoggers } from './list-loggers';
import { recordCalibration } from './record-calibration';
import { addLogger, changeLogger, switchLogger } from './save-logger';

useTestDatabase();

const todayOn = '2026-04-03';

async function as(role: Role): Promise<Context> {
	if (role === 'supplier')
		return contextFor(await buildUser(['supplier'], { partner: await buildPartner() }));
	return contextFor(await buildUser([role], { sites: [await buildSite()] }));
}

const filled = { serial: 'TR-0001', kind: 'reusable', accuracyCelsius: '0,5', startDelayMinutes: '10' };
const form = (more: Record<string, unknown> = {}) => loggerForm.parse({ ...filled, ...more });
const calibration = (more: Record<string, unknown> = {}) =>
	calibrationForm.parse({
		calibratedOn: '2026-03-01',
		dueOn: '2027-03-01',
		certificateNumber: 'K-118',
		laboratory: 'Pell metrology',
		errorCelsius: '−0.1',
		...more
	});

describe('the register of loggers', () => {
	it('is read by all staff, changed by admins only, and closed to suppliers', async () => {
		const id = await addLogger(await as('admin'), form());
		for (const role of ['dock', 'qa', 'claims', 'supplier'] as const) {
			const ctx = await as(role);
			const refused = expect.objectContaining({ code: 'not-allowed' });
			await expect(addLogger(ctx, form())).rejects.toEqual(refused);
			await expect(changeLogger(ctx, id, form())).rejects.toEqual(refused);
			await expect(switchLogger(ctx, id, false)).rejects.toEqual(refused);
			await expect(recordCalibration(ctx, id, calibration(), todayOn)).rejects.toEqual(refused);
			const reading = [
				() => listLoggers(ctx, loggerQuery.parse({}), todayOn),
				() => getLogger(ctx, id, todayOn)
			];
			for (const read of reading) {
				if (role === 'supplier') await expect(read()).rejects.toEqual(refused);
				else await expect(read()).resolves.toBeTruthy();
			}
		}
	});

	it('keeps serial, accuracy and owner, each serial once', async () => {
		const ctx = await as('admin');
		const owner = await buildPartner({ name: 'Merrow Line' });
		const id = await addLogger(ctx, form({ serial: 'TR-0042', ownerId: owner.id }));
		expect(await getLogger(ctx, id, todayOn)).toMatchObject({
			serial: 'TR-0042',
			accuracyCelsius: 0.5,
			ownerName: 'Merrow Line',
			isOverdue: false
		});
		await expect(addLogger(ctx, form({ serial: 'TR-0042' }))).rejects.toMatchObject({ code: 'duplicate' });
		const stranger = addLogger(ctx, form({ serial: 'TR-0043', ownerId: ctx.actor.id }));
		await expect(stranger).rejects.toMatchObject({ code: 'not-found' });
	});

	it('writes both states of a change and refuses one drawn before another was saved', async () => {
		const ctx = await as('admin');
		const id = await addLogger(ctx, form({ serial: 'TR-0050' }));
		const { revision } = await getLogger(ctx, id, todayOn);
		await changeLogger(ctx, id, form({ serial: 'TR-0050', accuracyCelsius: '0.3', revision }));
		const entry = await AuditEntry.findOne({ where: { type: 'logger.saved' }, order: [['seq', 'DESC']] });
		const payload = await AuditPayload.findByPk(entry?.id ?? '');
		expect(JSON.parse(payload?.text ?? '')).toMatchObject({
			before: { accuracyCelsius: 0.5 },
			after: { accuracyCelsius: 0.3 }
		});
		const late = changeLogger(ctx, id, form({ serial: 'TR-0050', revision }));
		await expect(late).rejects.toMatchObject({ code: 'changed-meanwhile' });
	});

	it('lists what is overdue on the day at the site, and counts it', async () => {
		const ctx = await as('admin');
		await addLogger(ctx, form({ serial: 'OV-1', calibrationDueOn: '2026-04-02' }));
		await addLogger(ctx, form({ serial: 'OV-2', calibrationDueOn: '2026-04-03' }));
		const off = await addLogger(ctx, form({ serial: 'OV-3', calibrationDueOn: '2025-01-01' }));
		await switchLogger(ctx, off, false);
		const list = (query: Record<string, string>) => listLoggers(ctx, loggerQuery.parse(query), todayOn);
		const overdue = await list({ state: 'overdue' });
		expect(overdue.items.map(({ serial }) => serial)).toEqual(['OV-1']);
		expect(overdue.overdue).toBe(1);
		expect((await list({ q: 'OV-', state: 'off' })).items.map(({ serial }) => serial)).toEqual(['OV-3']);
		const byDue = (await list({ sort: 'due' })).items.map(({ calibrationDueOn }) => calibrationDueOn);
		expect(byDue.slice(0, 2)).toEqual(['2026-04-02', '2026-04-03']);
		expect(byDue.at(-1)).toBeNull();
		expect((await list({ kind: 'one-trip' })).total).toBe(0);
	});
});

describe('a calibration', () => {
	it('moves the due day, unless a newer one is known', async () => {
		const ctx = await as('admin');
		const id = await addLogger(ctx, form({ serial: 'CA-1', calibrationDueOn: '2026-03-20' }));
		await recordCalibration(ctx, id, calibration(), todayOn);
		expect((await getLogger(ctx, id, todayOn)).calibrationDueOn).toBe('2027-03-01');
		await recordCalibration(
			ctx,
			id,
			calibration({ calibratedOn: '2025-03-01', dueOn: '2026-03-01', certificateNumber: 'K-91' }),
			todayOn
		);
		const logger = await getLogger(ctx, id, todayOn);
		expect(logger.calibrationDueOn).toBe('2027-03-01');
		expect(logger.calibrations.map(({ certificateNumber }) => certificateNumber)).toEqual(['K-118', 'K-91']);
		expect(logger.calibrations[0]?.errorCelsius).toBe(-0.1);
	});

	it('cannot lie in the future, nor be due before it was made', async () => {
		const ctx = await as('admin');
		const id = await addLogger(ctx, form({ serial: 'CA-2' }));
		const early = recordCalibration(ctx, id, calibration({ calibratedOn: '2026-04-04' }), todayOn);
		await expect(early).rejects.toMatchObject({ code: 'invalid' });
		expect(
			calibrationForm.safeParse({ ...calibration(), errorCelsius: '', dueOn: '2026-03-01' }).success
		).toBe(false);
	});
});

describe('the form of a logger', () => {
	const faults = (more: Record<string, unknown>) =>
		loggerForm.safeParse({ ...filled, ...more }).error?.issues.map((issue) => issue.path.join('.'));

	it('never assumes an accuracy', () => {
		expect(faults({ accuracyCelsius: '' })).toEqual(['accuracyCelsius']);
		expect(faults({ accuracyCelsius: '0' })).toEqual(['accuracyCelsius']);
		expect(faults({ accuracyCelsius: '0.5 K' })).toEqual(['accuracyCelsius']);
		expect(faults({ accuracyCelsius: '0.25' })).toBeUndefined();
	});

	it('takes whole minutes and real days', () => {
		expect(faults({ startDelayMinutes: '1.5' })).toEqual(['startDelayMinutes']);
		expect(faults({ startDelayMinutes: '' })).toEqual(['startDelayMinutes']);
		expect(faults({ calibrationDueOn: '2026-02-30' })).toEqual(['calibrationDueOn']);
	});
});
