import { table } from '../table-migration';

/** An ordered instant at which custody passes to a holder. */
export const { up, down } = table({
	name: 'handovers',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		ordinal INT NOT NULL,
		partner_id UUID NULL,
		holder VARCHAR(120) NOT NULL,
		place VARCHAR(160) NOT NULL,
		planned_at DATETIME(3) NULL,
		actual_at DATETIME(3) NULL,
		plus_minus_minutes INT NOT NULL,
		source VARCHAR(120) NULL,
		set_point_celsius DOUBLE NULL,
		allowed_hours DOUBLE NULL,
		UNIQUE KEY handovers_ordinal (shipment_id, ordinal),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (partner_id) REFERENCES partners (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
