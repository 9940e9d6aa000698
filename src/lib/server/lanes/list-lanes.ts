import { Op, type WhereOptions } from 'sequelize';
import type { LaneQuery } from '../../schemas/lane';
import { inState, pageOf, searchIn } from '../catalogue/search';
import type { Context } from '../context';
import { Lane } from '../db/models/lane';
import { Partner } from '../db/models/partner';
import { Site } from '../db/models/site';
import { authorize } from '../policies';
import { laneView, type LaneView } from './views';

const sortColumns = { name: 'name', since: 'createdAt' } as const;

async function namesOf(lanes: readonly Lane[]): Promise<Map<string, string>> {
	const attributes = ['id', 'name'];
	const sites = await Site.findAll({ attributes, where: { id: lanes.map(({ siteId }) => siteId) } });
	const supplierIds = lanes.flatMap(({ supplierId }) => supplierId ?? []);
	const suppliers = await Partner.findAll({ attributes, where: { id: supplierIds } });
	return new Map([...sites, ...suppliers].map(({ id, name }) => [id, name]));
}

/** Lanes with the names of both their ends. */
export async function withEnds(lanes: readonly Lane[]): Promise<LaneView[]> {
	const names = await namesOf(lanes);
	return lanes.map((lane) =>
		laneView(lane, names.get(lane.siteId) ?? '', names.get(lane.supplierId ?? '') ?? null)
	);
}

/** Every lane, for those who keep them. @throws Refusal `not-allowed` */
export async function listLanes(
	ctx: Context,
	query: LaneQuery
): Promise<{ items: LaneView[]; total: number }> {
	authorize(ctx, 'catalogue.change');
	const { rows, count } = await Lane.findAndCountAll({
		where: { ...searchIn<Lane>(['name'], query.q), ...inState(query.state) } as WhereOptions<Lane>,
		order: [
			[sortColumns[query.sort], query.dir],
			['id', 'asc']
		],
		...pageOf(query)
	});
	return { items: await withEnds(rows), total: count };
}

/** A lane as the form of a docket's papers offers it; it can be chosen for its own supplier, or for any. */
export interface LaneChoice {
	id: string;
	name: string;
	supplierName: string | null;
}

/** The lanes in use that lead to a site, and the one a docket is on already, by name. @throws Refusal `not-allowed` */
export async function listLaneChoices(
	ctx: Context,
	siteId: string,
	ownLaneId: string | null = null
): Promise<LaneChoice[]> {
	authorize(ctx, 'shipment.create');
	const isOffered = { [Op.or]: [{ switchedOffAt: null }, { id: ownLaneId }] };
	const lanes = await Lane.findAll({ where: { siteId, ...isOffered }, order: [['name', 'asc']] });
	return (await withEnds(lanes)).map(({ id, name, supplierName }) => ({ id, name, supplierName }));
}
