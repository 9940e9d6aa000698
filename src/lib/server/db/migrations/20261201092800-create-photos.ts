import { table } from '../table-migration';

/** A picture taken at the door. */
export const { up, down } = table({
	name: 'photos',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		file_id UUID NOT NULL,
		kind ENUM ('load', 'seal', 'set-point', 'papers', 'damage', 'pulp', 'other') NOT NULL,
		caption VARCHAR(200) NOT NULL,
		taken_by UUID NOT NULL,
		taken_at DATETIME(3) NOT NULL,
		KEY photos_shipment (shipment_id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (file_id) REFERENCES files (id),
		FOREIGN KEY (taken_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
