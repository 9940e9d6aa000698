import { table } from '../table-migration';

/** What a qualified person has determined of goods that were over an absolute stop. Append-only. */
export const { up, down } = table({
	name: 'determinations',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		evidence_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		text TEXT NOT NULL,
		signed_by UUID NOT NULL,
		signed_name VARCHAR(120) NOT NULL,
		signed_title VARCHAR(120) NOT NULL,
		signed_at DATETIME(3) NOT NULL,
		zone VARCHAR(64) NOT NULL,
		KEY determinations_shipment (shipment_id, signed_at),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (signed_by) REFERENCES users (id)
	`,
	grants: []
});
