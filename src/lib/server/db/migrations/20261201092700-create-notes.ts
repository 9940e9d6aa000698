import { table } from '../table-migration';

/** A note on a docket. */
export const { up, down } = table({
	name: 'notes',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		text TEXT NOT NULL DEFAULT '',
		written_by UUID NOT NULL,
		written_at DATETIME(3) NOT NULL,
		KEY notes_shipment (shipment_id, written_at),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (written_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
