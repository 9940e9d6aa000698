import { table } from '../table-migration';

/** What was seen at the door. */
export const { up, down } = table({
	name: 'arrivals',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		arrived_at DATETIME(3) NOT NULL,
		seal_found VARCHAR(60) NULL,
		is_seal_intact BOOLEAN NULL,
		set_point_celsius DOUBLE NULL,
		return_air_celsius DOUBLE NULL,
		condition_note TEXT NOT NULL DEFAULT '',
		driver_name VARCHAR(120) NULL,
		driver_signature_id UUID NULL,
		reservation TEXT NOT NULL DEFAULT '',
		logged_by UUID NOT NULL,
		logged_at DATETIME(3) NOT NULL,
		UNIQUE KEY arrivals_shipment (shipment_id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (driver_signature_id) REFERENCES files (id),
		FOREIGN KEY (logged_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
