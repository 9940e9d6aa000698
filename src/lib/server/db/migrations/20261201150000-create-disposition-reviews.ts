import { table } from '../table-migration';

/** A signed review of a decision that another person approves. Append-only, as a signature is. */
export const { up, down } = table({
	name: 'disposition_reviews',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		evidence_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		decision_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		decision TEXT NOT NULL,
		reasons TEXT NOT NULL DEFAULT '',
		signed_by UUID NOT NULL,
		signed_name VARCHAR(120) NOT NULL,
		signed_title VARCHAR(120) NOT NULL,
		signed_at DATETIME(3) NOT NULL,
		zone VARCHAR(64) NOT NULL,
		KEY disposition_reviews_shipment (shipment_id, signed_at),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (signed_by) REFERENCES users (id)
	`,
	grants: []
});
