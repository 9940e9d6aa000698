import { table } from '../table-migration';

/** Money asked back from whoever had custody. */
export const { up, down } = table({
	name: 'claims',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		number VARCHAR(24) NOT NULL,
		shipment_id UUID NOT NULL,
		disposition_id UUID NULL,
		against_id UUID NULL,
		status ENUM ('open', 'noticed', 'filed', 'settled', 'declined', 'closed') NOT NULL,
		amount_minor BIGINT NULL,
		currency CHAR(3) CHARACTER SET ascii NOT NULL,
		basis TEXT NOT NULL DEFAULT '',
		opened_by UUID NOT NULL,
		opened_at DATETIME(3) NOT NULL,
		closed_at DATETIME(3) NULL,
		version INT NOT NULL DEFAULT 0,
		UNIQUE KEY claims_number (number),
		KEY claims_shipment (shipment_id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (disposition_id) REFERENCES dispositions (id),
		FOREIGN KEY (against_id) REFERENCES partners (id),
		FOREIGN KEY (opened_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
