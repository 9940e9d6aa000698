import { table } from '../table-migration';

/** A deadline that runs on a docket, notice or claim. */
export const { up, down } = table({
	name: 'clocks',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		notice_id UUID NULL,
		claim_id UUID NULL,
		name VARCHAR(120) NOT NULL,
		basis VARCHAR(160) NOT NULL,
		starts_at DATETIME(3) NOT NULL,
		deadline_at DATETIME(3) NOT NULL,
		met_at DATETIME(3) NULL,
		met_by VARCHAR(200) NULL,
		KEY clocks_open (met_at, deadline_at),
		KEY clocks_shipment (shipment_id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (notice_id) REFERENCES notices (id),
		FOREIGN KEY (claim_id) REFERENCES claims (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
