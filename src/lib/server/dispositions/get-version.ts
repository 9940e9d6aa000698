import type { DocketView } from '../../schemas/docket';
import type { Context } from '../context';
import { Disposition } from '../db/models/disposition';
import { getDocket } from '../dockets/get-docket';
import { Refusal } from '../refusals';
import { frozenDocketOf } from '../reports/frozen-docket';

/**
 * The docket as one version of its decision froze it, with the signatures up to then; what came after is left out.
 * @throws Refusal `not-found`, `not-allowed`
 */
export async function getVersion(ctx: Context, number: string, version: number): Promise<DocketView> {
	const now = await getDocket(ctx, number);
	const row = await Disposition.findOne({ where: { shipmentId: now.id, version } });
	if (!row) throw new Refusal('not-found', 'There is no such version of this docket.');
	return {
		...frozenDocketOf(row).docket,
		// What it was put on hold for ended with this signature.
		hold: null,
		stage: 'done',
		signatures: now.signatures.filter((signature) => signature.version <= version),
		notices: [],
		clocks: [],
		claimId: null,
		record: []
	};
}
