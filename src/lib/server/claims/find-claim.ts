import type { Context } from '../context';
import { Claim } from '../db/models/claim';
import { Shipment } from '../db/models/shipment';
import { authorizeShipment, type Act } from '../policies';
import { Refusal } from '../refusals';

/** A claim with its docket, for whoever may do `act` on it. @throws Refusal `not-found`, `not-allowed` */
export async function getClaimFor(
	ctx: Context,
	claimId: string,
	act: Act
): Promise<{ claim: Claim; shipment: Shipment }> {
	const claim = await Claim.findByPk(claimId);
	const shipment = claim ? await Shipment.findByPk(claim.shipmentId) : null;
	authorizeShipment(ctx, act, shipment);
	if (!claim) throw new Refusal('not-found');
	return { claim, shipment: shipment as Shipment };
}
