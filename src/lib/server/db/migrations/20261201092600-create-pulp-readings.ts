import { table } from '../table-migration';

/** A probe reading at the door, kept as written. */
export const { up, down } = table({
	name: 'pulp_readings',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		line_id UUID NULL,
		position VARCHAR(80) NOT NULL,
		case_label VARCHAR(80) NULL,
		degrees DOUBLE NOT NULL,
		unit ENUM ('celsius', 'fahrenheit') NOT NULL,
		instrument VARCHAR(80) NULL,
		taken_at DATETIME(3) NOT NULL,
		taken_by UUID NOT NULL,
		KEY pulp_readings_shipment (shipment_id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (line_id) REFERENCES shipment_lines (id),
		FOREIGN KEY (taken_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
