import { QueryTypes, type Transaction } from 'sequelize';
import { database } from '../db/sequelize';

/** What a kind of record says of people, beside the trail, and what it is emptied to. Signed records stay as they were signed. */
interface PersonalRows {
	kind: 'notes' | 'arrivals' | 'answers';
	/** Rows of a docket that still say something. */
	from: string;
	set: string;
}

const personalRows: readonly PersonalRows[] = [
	{ kind: 'notes', from: "notes n WHERE n.shipment_id = :shipmentId AND n.text <> ''", set: "n.text = ''" },
	{
		kind: 'arrivals',
		from: `arrivals n WHERE n.shipment_id = :shipmentId
			AND (n.driver_name IS NOT NULL OR n.reservation <> '' OR n.condition_note <> '')`,
		set: "n.driver_name = NULL, n.reservation = '', n.condition_note = ''"
	},
	{
		kind: 'answers',
		from: `notice_answers n WHERE n.notice_id IN (SELECT id FROM notices WHERE shipment_id = :shipmentId)
			AND (n.who <> '' OR n.answered_by <> '')`,
		set: "n.who = '', n.answered_by = ''"
	}
];

/** How many rows of a docket still say something of people, by kind; kinds without any are left out. */
export async function countPersonal(
	shipmentId: string,
	transaction?: Transaction
): Promise<Partial<Record<PersonalRows['kind'], number>>> {
	const counted = await Promise.all(
		personalRows.map(async ({ kind, from }) => {
			const [row] = await database().query<{ total: number }>(`SELECT COUNT(*) AS total FROM ${from}`, {
				replacements: { shipmentId },
				type: QueryTypes.SELECT,
				transaction
			});
			return [kind, Number(row?.total ?? 0)] as const;
		})
	);
	return Object.fromEntries(counted.filter(([, total]) => total > 0));
}

/** Empties them. */
export async function emptyPersonal(shipmentId: string, transaction: Transaction): Promise<void> {
	for (const { from, set } of personalRows) {
		const [table = '', where = ''] = from.split(/ WHERE (.*)/s);
		await database().query(`UPDATE ${table} SET ${set} WHERE ${where}`, {
			replacements: { shipmentId },
			type: QueryTypes.UPDATE,
			transaction
		});
	}
}
