import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildProduct,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testPassword
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import type { DispositionInput } from '../../schemas/disposition';
import type { Role } from '../context';
import { Arrival } from '../db/models/arrival';
import { Disposition } from '../db/models/disposition';
import { DispositionReview } from '../db/models/disposition-review';
import { LineRecommendation } from '../db/models/line-recommendation';
import { Shipment } from '../db/models/shipment';
import { evidenceSha256 } from '../dispositions/freeze';
import { signDisposition } from '../dispositions/sign-disposition';
import { getDocket } from '../dockets/get-docket';
import { frozenDocketOf } from '../reports/frozen-docket';
import { mayAcceptAtDock } from './dock-accept';
import { setSigningRules } from './signing-rules';
import { writeDetermination } from './write-determination';

useTestDatabase();

interface Wanted {
	dockMayAccept?: boolean;
	recommended?: 'accept' | 'hold' | 'reject' | null;
	grade?: 'note' | 'hold' | 'reject';
	code?: string;
}

/** A load at the door whose line has the recommendation asked for. */
async function atTheDoor({
	dockMayAccept = false,
	recommended = 'accept',
	grade = 'note',
	code
}: Wanted = {}) {
	const site = await buildSite();
	const { product } = await buildProduct();
	await product.update({ dockMayAccept });
	const { shipment, lines } = await buildShipment({
		site,
		product,
		lines: [{ valueMinor: 2_500_000, currency: 'EUR' }]
	});
	const person = async (role: Role, more = {}) =>
		contextFor(await buildUser([role], { sites: [site], ...more }));
	const dock = await person('dock');
	await shipment.update({ arrivedAt: testNow });
	await Arrival.create({
		...{ id: uuid(), shipmentId: shipment.id, arrivedAt: testNow, isSealIntact: true },
		...{ loggedBy: dock.actor.id, loggedAt: testNow }
	});
	await LineRecommendation.destroy({ where: { shipmentId: shipment.id } });
	if (recommended !== null)
		await LineRecommendation.create({
			id: uuid(),
			shipmentId: shipment.id,
			lineId: lines[0]?.id ?? '',
			recommended,
			reasons: JSON.stringify([{ code: code ?? 'life-not-known', grade }]),
			madeAt: testNow
		});
	const decide = async (changes: Partial<DispositionInput> = {}): Promise<DispositionInput> => ({
		lines: [{ lineId: lines[0]?.id ?? '', outcome: 'accept', condition: null, reason: null }],
		reasons: 'Cold throughout.',
		meaning: 'approval',
		password: testPassword,
		evidenceSha256: evidenceSha256(await getDocket(dock, shipment.number)),
		amendmentReason: null,
		notify: false,
		...changes
	});
	return { shipment, lines, person, dock, decide };
}

async function frozenOf(shipmentId: string) {
	const disposition = await Disposition.findOne({ where: { shipmentId }, rejectOnEmpty: true });
	return frozenDocketOf(disposition);
}

describe('the dock', () => {
	it('accepts a load that nothing speaks against, where the product permits it', async () => {
		const { shipment, dock, decide } = await atTheDoor({ dockMayAccept: true });
		expect(await mayAcceptAtDock(dock, await getDocket(dock, shipment.number))).toBe(true);
		await signDisposition(dock, shipment.number, await decide());
		expect((await Shipment.findByPk(shipment.id))?.verdict).toBe('accepted');
	});

	it.each([
		['the product does not permit it', { dockMayAccept: false }],
		['a finding holds', { dockMayAccept: true, grade: 'hold' as const }],
		['a hold is recommended', { dockMayAccept: true, recommended: 'hold' as const }],
		['nothing is recommended', { dockMayAccept: true, recommended: null }]
	])('does not where %s', async (_why, wanted) => {
		const { shipment, dock, decide } = await atTheDoor(wanted);
		expect(await mayAcceptAtDock(dock, await getDocket(dock, shipment.number))).toBe(false);
		await expect(signDisposition(dock, shipment.number, await decide())).rejects.toMatchObject({
			code: 'not-allowed'
		});
		expect(await Disposition.count({ where: { shipmentId: shipment.id } })).toBe(0);
	});
});

describe('a second signature', () => {
	it('is a review by one person and the same decision approved by another, both frozen', async () => {
		const { shipment, lines, person, decide } = await atTheDoor();
		await setSigningRules(await person('admin'), {
			fromValue: { minor: 2_000_000, currency: 'EUR' },
			fromSeverity: null
		});
		const [first, second] = [await person('qa'), await person('qa')];
		const alone = signDisposition(first, shipment.number, await decide());
		await expect(alone).rejects.toMatchObject({ code: 'not-yet-yours' });

		const review = await decide({ meaning: 'review', reasons: 'Checked the trace.' });
		expect(await signDisposition(first, shipment.number, review)).toEqual({ version: null });
		expect((await Shipment.findByPk(shipment.id))?.decidedAt).toBeNull();
		await expect(signDisposition(first, shipment.number, await decide())).rejects.toMatchObject({
			code: 'not-yet-yours'
		});
		const other = await decide({
			lines: [{ lineId: lines[0]?.id ?? '', outcome: 'reject', condition: null, reason: 'Warm' }]
		});
		await expect(signDisposition(second, shipment.number, other)).rejects.toMatchObject({
			code: 'not-yet-yours'
		});
		await signDisposition(second, shipment.number, await decide());
		const frozen = await frozenOf(shipment.id);
		expect(frozen.signature.signedBy).toBe(second.actor.name);
		expect(frozen.reviews).toMatchObject([{ by: first.actor.name, reasons: 'Checked the trace.' }]);
		await setSigningRules(await person('admin'), { fromValue: null, fromSeverity: null });
	});

	it('is not the dock’s to give', async () => {
		const { shipment, dock, decide } = await atTheDoor({ dockMayAccept: true });
		const review = await decide({ meaning: 'review' });
		await expect(signDisposition(dock, shipment.number, review)).rejects.toMatchObject({
			code: 'not-allowed'
		});
		expect(await DispositionReview.count({ where: { shipmentId: shipment.id } })).toBe(0);
	});

	it('is asked for by rules that only an admin sets', async () => {
		const { person } = await atTheDoor();
		const rules = { fromValue: null, fromSeverity: 'critical' as const };
		await expect(setSigningRules(await person('qa'), rules)).rejects.toMatchObject({ code: 'not-allowed' });
	});
});

describe('goods over a stop', () => {
	const stopped = { recommended: 'reject' as const, grade: 'reject' as const, code: 'stop-reached' };

	it('are taken only on a determination of the evidence as it stands', async () => {
		const { shipment, person, decide } = await atTheDoor(stopped);
		const qa = await person('qa');
		await expect(signDisposition(qa, shipment.number, await decide())).rejects.toMatchObject({
			code: 'not-yet-yours'
		});
		const { evidenceSha256: seen } = await decide();
		const form = {
			text: 'Core probes stayed under the limit.',
			password: testPassword,
			evidenceSha256: seen
		};
		await expect(writeDetermination(qa, shipment.number, form)).rejects.toMatchObject({
			code: 'not-allowed'
		});
		const qualified = await person('qa', { isQualifiedPerson: true });
		const stale = { ...form, evidenceSha256: '0'.repeat(64) };
		await expect(writeDetermination(qualified, shipment.number, stale)).rejects.toMatchObject({
			code: 'changed-meanwhile'
		});
		await writeDetermination(qualified, shipment.number, form);
		await signDisposition(qa, shipment.number, await decide());
		expect((await frozenOf(shipment.id)).determinations).toMatchObject([
			{ by: qualified.actor.name, text: form.text }
		]);
	});

	it('are refused without one', async () => {
		const { shipment, lines, person, decide } = await atTheDoor(stopped);
		const refusal = await decide({
			lines: [{ lineId: lines[0]?.id ?? '', outcome: 'reject', condition: null, reason: 'Frozen' }]
		});
		await signDisposition(await person('qa'), shipment.number, refusal);
		expect((await Shipment.findByPk(shipment.id))?.verdict).toBe('rejected');
	});
});
