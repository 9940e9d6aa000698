import { boardQuery } from '../../schemas/board';
import type { Context } from '../context';
import { authorize } from '../policies';
import { getOwnSite } from '../shipments/own-site';
import { searchDockets, type FoundDocket } from '../shipments/search-dockets';
import { listBoard } from './list-board';

/** Loads that may be at the door now: those expected today, or those that carry what was typed or scanned. */
export async function listExpected(ctx: Context, siteId: string, q: string): Promise<FoundDocket[]> {
	authorize(ctx, 'arrival.log');
	if (q !== '') return searchDockets(ctx, q, 40);
	const { zone } = await getOwnSite(ctx, siteId);
	const { rows } = await listBoard(ctx, siteId, boardQuery.parse({}));
	return rows
		.filter((row) => row.stage === 'expected')
		.map(({ id, number, stage, verdict, supplier, vehicle, dueAt, arrivedAt, goods }) => ({
			...{ id, number, stage, verdict, supplier, vehicle, dueAt, arrivedAt, zone },
			title: goods.product
		}));
}
