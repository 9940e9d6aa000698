import type { ImportPreview } from '../../schemas/import';
import type { Context } from '../context';
import type { Site } from '../db/models/site';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { createShipment } from './create-shipment';
import { getOwnSite } from './own-site';
import { planImport, type PlannedLoad } from './plan-import';
import { readNotices } from './read-notices';

type Plan = { fault: string } | { loads: PlannedLoad[]; rows: number };

async function planOf(site: Site, text: string): Promise<Plan> {
	const read = readNotices(text);
	return read.ok
		? { loads: await planImport(site, read.rows), rows: read.rows.length }
		: { fault: read.fault };
}

/** What a file of advance notices would open, and what is wrong with it by row and column. Writes nothing. */
export async function previewImport(ctx: Context, siteId: string, text: string): Promise<ImportPreview> {
	authorize(ctx, 'shipment.create');
	const plan = await planOf(await getOwnSite(ctx, siteId), text);
	if ('fault' in plan) return { fault: plan.fault, loads: [], rows: 0 };
	return {
		fault: null,
		rows: plan.rows,
		loads: plan.loads.map(({ name, rows, faults, knownAs }) => ({
			...{ name, faults, knownAs },
			firstRow: rows[0]?.row ?? 0,
			supplier: rows[0]?.cells.supplier ?? '',
			due: rows[0]?.cells.due ?? '',
			lines: rows.length,
			cases: rows.reduce((sum, { cells }) => sum + (Number(cells.cases) || 0), 0)
		}))
	};
}

/**
 * Opens a docket for every load of the file, or only for the good ones when that was asked for. Loads that are here
 * already are passed over, so the same file twice opens nothing twice. @throws Refusal `invalid` where faults are left
 */
export async function importNotices(
	ctx: Context,
	siteId: string,
	text: string,
	only: 'all' | 'good'
): Promise<{ numbers: string[]; known: number }> {
	authorize(ctx, 'shipment.create');
	const plan = await planOf(await getOwnSite(ctx, siteId), text);
	if ('fault' in plan) throw new Refusal('invalid', plan.fault);
	const faulty = plan.loads.filter((load) => load.faults.length > 0).length;
	if (faulty > 0 && only === 'all')
		throw new Refusal(
			'invalid',
			`${faulty} of ${plan.loads.length} loads have faults. Nothing was imported.`
		);
	const numbers: string[] = [];
	for (const { input, knownAs, faults } of plan.loads) {
		if (input === null || knownAs !== null || faults.length > 0) continue;
		numbers.push((await createShipment(ctx, siteId, input, 'import')).number);
	}
	return { numbers, known: plan.loads.filter((load) => load.knownAs !== null).length };
}
