import { describe, expect, it } from 'vitest';
import {
	buildProduct,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testSpec
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { buildTrace, steadyTrace } from '../../../../tests/helpers/trace-factory';
import type { Spec } from '../../domain/shelf-life/spec';
import { reassess } from '../assessments/reassess';
import { AssessmentRow } from '../db/models/assessment-row';
import { AuditEntry } from '../db/models/audit-entry';
import { LineRecommendation } from '../db/models/line-recommendation';
import { Variety } from '../db/models/variety';
import { inTransaction } from '../db/transaction';
import { saveDraft } from './save-draft';
import { tryVersion } from './try-version';

useTestDatabase();

const from = '2026-03-30T06:10:00Z';
const to = '2026-04-03T03:30:00Z';
/** First to last handover of the factory's load. */
const journeyHours = 93 + 1 / 3;
/** Limits far off, so that life alone decides. */
const openSpec: Spec = { ...testSpec, upper: null, lower: null, freezingCelsius: null, neededHours: 240 };

async function scene() {
	const site = await buildSite();
	const qa = await buildUser(['qa'], { sites: [site] });
	const admin = await contextFor(await buildUser(['admin'], { sites: [site] }));
	const { product, spec } = await buildProduct({ spec: openSpec });
	const arrive = async (celsius: number, options: Parameters<typeof buildShipment>[0] = {}) => {
		const made = await buildShipment({ site, product, arrivedAt: new Date(to), ...options });
		await buildTrace(made.shipment, qa, steadyTrace(celsius, from, to));
		await inTransaction(await contextFor(qa), (w) => reassess(w, admin, made.shipment.id));
		return made;
	};
	const draft = (figures: Spec, varietyId: string | null = null) =>
		saveDraft(admin, { productId: product.id, varietyId, figures, seenSha256: '' });
	return { site, qa, admin, product, spec, arrive, draft };
}

const storedTexts = async () => ({
	assessments: (await AssessmentRow.findAll({ order: ['id'], raw: true })).map((row) => JSON.stringify(row)),
	recommendations: (await LineRecommendation.findAll({ order: ['id'], raw: true })).map((row) =>
		JSON.stringify(row)
	),
	entries: await AuditEntry.count()
});

describe('a version tried against past loads', () => {
	it('names each docket it would have had decided otherwise, with then and now, and changes nothing', async () => {
		const { admin, product, arrive, draft } = await scene();
		// Q10 of 3: 5 °C runs 3^0.5 times as fast as 0 °C; 432 − 20 − 3^0.5 × 93.33 = 250.3 h left, 240 needed; its low
		// is 432 − 22 − 3^0.55 × 93.33 = 239.2 h, short. At 2 °C it is 295 h on the low, and enough.
		const warm = await arrive(5);
		await arrive(2);
		const { id } = await draft({ ...openSpec, neededHours: 200 });
		const before = await storedTexts();
		const trial = await tryVersion(admin, product.id, id);
		expect(trial).toMatchObject({ number: 2, tried: 2, untold: 0, isCapped: false });
		const [stored] = await LineRecommendation.findAll({ where: { shipmentId: warm.shipment.id } });
		expect(stored?.recommended).not.toBe('accept');
		expect(trial.differing).toMatchObject([
			{
				docket: warm.shipment.number,
				line: 1,
				specNumber: 1,
				then: { recommended: stored?.recommended, neededHours: 240 },
				now: { recommended: 'accept', neededHours: 200 }
			}
		]);
		const [one] = trial.differing;
		expect(one?.then.remainingHours?.value).toBeCloseTo(432 - 20 - 3 ** 0.5 * journeyHours, 9);
		expect(one?.now.remainingHours).toEqual(one?.then.remainingHours);
		expect(await storedTexts()).toEqual(before);
	});

	it('works life out by its own model', async () => {
		const { admin, product, arrive, draft } = await scene();
		await arrive(2);
		const { id } = await draft({ ...openSpec, model: { kind: 'constant-q10', q10: 30 } });
		const [one] = (await tryVersion(admin, product.id, id)).differing;
		expect(one?.then.recommended).toBe('accept');
		expect(one?.now.recommended).not.toBe('accept');
		expect(one?.now.remainingHours?.value).toBeCloseTo(432 - 20 - 30 ** 0.2 * journeyHours, 9);
	});

	it('finds nothing otherwise where the figures are the same', async () => {
		const { admin, product, arrive, draft } = await scene();
		await arrive(5);
		const { id } = await draft({ ...openSpec, caution: 'the same figures' });
		expect(await tryVersion(admin, product.id, id)).toMatchObject({ tried: 1, differing: [] });
	});

	it('is tried on its own variety alone, and one of the product on what has none of its own', async () => {
		const { admin, product, arrive, draft } = await scene();
		const variety = await Variety.create({ id: crypto.randomUUID(), productId: product.id, name: 'Early' });
		await arrive(5);
		await arrive(5, { lines: [{ varietyId: variety.id }] });
		const lenient = { ...openSpec, neededHours: 200 };
		const ofVariety = await draft(lenient, variety.id);
		expect((await tryVersion(admin, product.id, ofVariety.id)).tried).toBe(1);
		const ofProduct = await draft(lenient);
		expect((await tryVersion(admin, product.id, ofProduct.id)).tried).toBe(2);
	});

	it('is for who changes specs, of dockets within sight, and of a version of that product', async () => {
		const { qa, admin, product, spec, arrive, draft } = await scene();
		await arrive(5);
		const { id } = await draft({ ...openSpec, neededHours: 200 });
		const refusal = (code: string) => expect.objectContaining({ code });
		await expect(tryVersion(await contextFor(qa), product.id, id)).rejects.toEqual(refusal('not-allowed'));
		const other = await buildProduct();
		await expect(tryVersion(admin, other.product.id, spec.id)).rejects.toEqual(refusal('not-found'));
		const elsewhere = await contextFor(await buildUser(['admin'], { sites: [await buildSite()] }), testNow);
		expect(await tryVersion(elsewhere, product.id, id)).toMatchObject({ tried: 0, differing: [] });
	});
});
