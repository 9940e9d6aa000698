import { table } from '../table-migration';

/** An instrument on the register. */
export const { up, down } = table({
	name: 'loggers',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		serial VARCHAR(60) NOT NULL,
		kind ENUM ('reusable', 'one-trip') NOT NULL,
		owner_id UUID NULL,
		accuracy_celsius DOUBLE NOT NULL,
		start_delay_minutes INT NOT NULL,
		calibration_due_on DATE NULL,
		note VARCHAR(300) NOT NULL,
		created_at DATETIME(3) NOT NULL,
		switched_off_at DATETIME(3) NULL,
		UNIQUE KEY loggers_serial (serial),
		FOREIGN KEY (owner_id) REFERENCES partners (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
