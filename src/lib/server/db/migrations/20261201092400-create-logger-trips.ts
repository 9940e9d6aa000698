import { table } from '../table-migration';

/** A logger expected or found on a load, and what became of it. */
export const { up, down } = table({
	name: 'logger_trips',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		logger_id UUID NULL,
		serial VARCHAR(60) NOT NULL,
		ordinal INT NOT NULL,
		line_id UUID NULL,
		pallet_id UUID NULL,
		position VARCHAR(120) NULL,
		placement ENUM ('air', 'between-cases', 'in-product') NOT NULL,
		status ENUM ('expected', 'found', 'not-found', 'dead', 'not-started', 'other-load') NOT NULL,
		UNIQUE KEY logger_trips_serial (shipment_id, serial),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (logger_id) REFERENCES loggers (id),
		FOREIGN KEY (line_id) REFERENCES shipment_lines (id),
		FOREIGN KEY (pallet_id) REFERENCES pallets (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
