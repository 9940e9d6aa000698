import { table } from '../table-migration';

/** A docket kept beyond its period because somebody said so; one under an open claim is kept without. */
export const { up, down } = table({
	name: 'retention_holds',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		reason VARCHAR(1000) NOT NULL,
		put_by UUID NOT NULL,
		put_at DATETIME(3) NOT NULL,
		lifted_by UUID NULL,
		lifted_at DATETIME(3) NULL,
		lift_reason VARCHAR(1000) NULL,
		KEY retention_holds_shipment (shipment_id, lifted_at),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (put_by) REFERENCES users (id),
		FOREIGN KEY (lifted_by) REFERENCES users (id)
	`,
	grants: ['UPDATE']
});
