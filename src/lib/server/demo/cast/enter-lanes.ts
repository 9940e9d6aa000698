import { laneForm } from '../../../schemas/lane';
import type { Context } from '../../context';
import { addLane } from '../../lanes/save-lane';
import type { SiteKey } from './sites';

interface DemoLane {
	name: string;
	site: SiteKey;
	supplier: string | null;
	isLoggerRequired: boolean;
	grades: Record<string, string>;
}

/** Lanes with rules of their own; a docket is put on one with its papers. */
const lanes: readonly DemoLane[] = [
	{
		name: 'Olmarisa berries, road and sea',
		site: 'PS',
		supplier: 'olmarisa',
		isLoggerRequired: true,
		grades: { 'logger-missing': 'hold', 'calibration-overdue': 'hold', 'transit-late': 'inform' }
	},
	{
		name: 'Short road into the mill',
		site: 'HM',
		supplier: null,
		isLoggerRequired: false,
		grades: { 'interval-too-long': 'inform' }
	}
];

/** Enters the lanes. */
export async function enterLanes(
	ctx: Context,
	siteIds: Readonly<Record<SiteKey, string>>,
	partnerIds: ReadonlyMap<string, string>
): Promise<void> {
	for (const { name, site, supplier, isLoggerRequired, grades } of lanes) {
		const supplierId = supplier ? (partnerIds.get(supplier) ?? '') : '';
		const ticked = isLoggerRequired ? 'on' : '';
		await addLane(
			ctx,
			laneForm.parse({ name, siteId: siteIds[site], supplierId, isLoggerRequired: ticked, grades })
		);
	}
}
