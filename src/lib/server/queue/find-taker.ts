import type { Context } from '../context';
import { Shipment } from '../db/models/shipment';
import { User } from '../db/models/user';
import { authorizeShipment } from '../policies';

/** Who has taken a docket's review on, and whether that is the one who asks; null while nobody has. */
export async function findTaker(
	ctx: Context,
	number: string
): Promise<{ name: string; at: string | null; isOwn: boolean } | null> {
	const shipment = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, 'docket.view', shipment);
	const { takenBy, takenAt } = shipment as Shipment;
	if (takenBy === null) return null;
	const user = await User.findByPk(takenBy, { attributes: ['name'] });
	return {
		name: user?.name ?? 'somebody',
		at: takenAt?.toISOString() ?? null,
		isOwn: takenBy === ctx.actor.id
	};
}
