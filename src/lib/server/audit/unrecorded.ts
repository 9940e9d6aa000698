import { QueryTypes, type Transaction } from 'sequelize';
import { database } from '../db/sequelize';

export interface UnrecordedSignature {
	docket: string;
	version: number;
}

/** Signed decisions whose docket's chain holds fewer signatures than that: entries and heads were taken away together. */
export async function signaturesWithoutEntry(transaction?: Transaction): Promise<UnrecordedSignature[]> {
	return database().query<UnrecordedSignature>(
		`SELECT s.number AS docket, d.version FROM dispositions d JOIN shipments s ON s.id = d.shipment_id
		WHERE d.version > (SELECT COUNT(*) FROM audit_entries e
			WHERE e.chain_id = d.shipment_id AND e.type = 'disposition.signed')
		ORDER BY s.number, d.version`,
		{ type: QueryTypes.SELECT, transaction }
	);
}
