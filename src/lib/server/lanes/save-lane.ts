import { v7 as uuid } from 'uuid';
import type { LaneForm } from '../../schemas/lane';
import { inOrder } from '../assessments/finding-grades';
import { orDuplicate } from '../catalogue/duplicate';
import { assertUnchanged } from '../catalogue/revision';
import type { Context } from '../context';
import { Lane } from '../db/models/lane';
import { Partner } from '../db/models/partner';
import { Shipment } from '../db/models/shipment';
import { Site } from '../db/models/site';
import { inTransaction, type Writing } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { laneFields } from './views';

const taken = 'There is a lane of that name already.';

/** The columns a form fills. */
function columnsOf({ name, siteId, supplierId, isLoggerRequired, grades }: LaneForm) {
	return { name, siteId, supplierId, isLoggerRequired, findingGrades: inOrder(grades) };
}

async function assertEnds({ siteId, supplierId }: LaneForm, { transaction }: Writing): Promise<void> {
	if (!(await Site.findByPk(siteId, { transaction })))
		throw new Refusal('not-found', 'There is no such site. Choose another.');
	if (supplierId && !(await Partner.findByPk(supplierId, { transaction }))?.isSupplier)
		throw new Refusal('not-found', 'There is no such supplier. Choose another.');
}

/** Dockets on a lane stay on it, so it may be opened to every supplier but not led elsewhere. */
async function assertEndsStay(lane: Lane, form: LaneForm, { transaction }: Writing): Promise<void> {
	const isSame = form.supplierId === null || form.supplierId === lane.supplierId;
	if (isSame && form.siteId === lane.siteId) return;
	if (await Shipment.findOne({ where: { laneId: lane.id }, attributes: ['id'], transaction }))
		throw new Refusal('in-use', 'Dockets are on this lane, so where it begins and ends stays.');
}

/** Makes a lane. @returns its id. @throws Refusal `not-allowed`, `duplicate`, `not-found` */
export async function addLane(ctx: Context, form: LaneForm): Promise<string> {
	authorize(ctx, 'catalogue.change');
	const id = uuid();
	const writing = inTransaction(ctx, async (w) => {
		const { transaction } = w;
		await assertEnds(form, w);
		const made = { id, ...columnsOf(form), createdAt: ctx.now, switchedOffAt: null };
		const lane = await Lane.create(made, { transaction });
		const chain = { scope: 'site', id: lane.siteId } as const;
		w.record('lane.saved', chain, { laneId: id, before: null, after: laneFields(lane) });
	});
	await orDuplicate(writing, taken);
	return id;
}

/**
 * Changes a lane; its grades count from the next assessment of each open docket on it.
 * @throws Refusal `not-found`, `not-allowed`, `duplicate`, `in-use`, `changed-meanwhile`
 */
export async function changeLane(ctx: Context, laneId: string, form: LaneForm): Promise<void> {
	authorize(ctx, 'catalogue.change');
	const writing = inTransaction(ctx, async (w) => {
		const { transaction } = w;
		const lane = await Lane.findByPk(laneId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!lane) throw new Refusal('not-found');
		const before = laneFields(lane);
		assertUnchanged(form.revision, before);
		await assertEnds(form, w);
		await assertEndsStay(lane, form, w);
		await lane.update(columnsOf(form), { transaction });
		const chain = { scope: 'site', id: lane.siteId } as const;
		w.record('lane.saved', chain, { laneId, before, after: laneFields(lane) });
	});
	await orDuplicate(writing, taken);
}

/** Takes a lane out of use, or back in; dockets stay on it. @throws Refusal `not-found`, `not-allowed` */
export async function switchLane(ctx: Context, laneId: string, isOn: boolean): Promise<void> {
	authorize(ctx, 'catalogue.change');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const lane = await Lane.findByPk(laneId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!lane) throw new Refusal('not-found');
		if ((lane.switchedOffAt === null) === isOn) return;
		await lane.update({ switchedOffAt: isOn ? null : ctx.now }, { transaction });
		const chain = { scope: 'site', id: lane.siteId } as const;
		record('lane.saved', chain, { laneId, before: { isInUse: !isOn }, after: { isInUse: isOn } });
	});
}
