import { table } from '../table-migration';

/** All readings of one channel, packed. */
export const { up, down } = table({
	name: 'traces',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		read_id UUID NOT NULL,
		shipment_id UUID NOT NULL,
		ordinal INT NOT NULL,
		name VARCHAR(120) NOT NULL,
		quantity VARCHAR(20) NOT NULL,
		unit VARCHAR(20) NOT NULL,
		decimals INT NOT NULL,
		readings INT NOT NULL,
		first_at DATETIME(3) NOT NULL,
		last_at DATETIME(3) NOT NULL,
		usual_interval_ms BIGINT NOT NULL,
		min_celsius DOUBLE NULL,
		max_celsius DOUBLE NULL,
		mean_celsius DOUBLE NULL,
		packed LONGBLOB NOT NULL,
		content_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		trip_id UUID NULL,
		is_assessed BOOLEAN NOT NULL,
		clock_shift_ms BIGINT NOT NULL DEFAULT 0,
		KEY traces_shipment (shipment_id),
		FOREIGN KEY (read_id) REFERENCES logger_reads (id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (trip_id) REFERENCES logger_trips (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
