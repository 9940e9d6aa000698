import { QueryTypes, type Transaction } from 'sequelize';
import { Shipment } from '../db/models/shipment';
import type { ShipmentLine } from '../db/models/shipment-line';

/**
 * The latest printed date of a line's product that its site took in before this load arrived; null where there is
 * none. What was rejected was not taken in.
 */
export async function findLastBestBefore(
	line: ShipmentLine,
	{ id, siteId, arrivedAt }: Shipment,
	now: Date,
	transaction?: Transaction
): Promise<string | null> {
	const sequelize = Shipment.sequelize;
	if (!sequelize) throw new Error('The models are not defined.');
	const [row] = await sequelize.query<{ latest: string | null }>(
		`SELECT DATE_FORMAT(MAX(l.best_before_on), '%Y-%m-%d') AS latest
		FROM shipment_lines l JOIN shipments s ON s.id = l.shipment_id
		WHERE l.product_id = :productId AND s.site_id = :siteId AND s.id <> :id
			AND s.arrived_at < :before AND s.cancelled_at IS NULL
			AND (s.verdict IS NULL OR s.verdict <> 'rejected')`,
		{
			type: QueryTypes.SELECT,
			replacements: { productId: line.productId, siteId, id, before: arrivedAt ?? now },
			...(transaction ? { transaction } : {})
		}
	);
	return row?.latest ?? null;
}
