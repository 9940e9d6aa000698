import { table } from '../table-migration';

/** A docket put on hold, and lifted. */
export const { up, down } = table({
	name: 'holds',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		put_by UUID NOT NULL,
		put_at DATETIME(3) NOT NULL,
		reason TEXT NOT NULL DEFAULT '',
		lifted_by UUID NULL,
		lifted_at DATETIME(3) NULL,
		KEY holds_open (shipment_id, lifted_at),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (put_by) REFERENCES users (id),
		FOREIGN KEY (lifted_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
