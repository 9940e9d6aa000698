import { table } from '../table-migration';

/** One truck at the door. */
export const { up, down } = table({
	name: 'visits',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		site_id UUID NOT NULL,
		carrier_id UUID NULL,
		trailer VARCHAR(40) NOT NULL,
		driver_name VARCHAR(120) NOT NULL,
		dock VARCHAR(40) NOT NULL,
		stops_made INT NULL,
		stops_to_come INT NULL,
		seal_off VARCHAR(40) NULL,
		seal_on VARCHAR(40) NULL,
		arrived_at DATETIME(3) NOT NULL,
		departed_at DATETIME(3) NULL,
		KEY visits_site (site_id, arrived_at),
		FOREIGN KEY (site_id) REFERENCES sites (id),
		FOREIGN KEY (carrier_id) REFERENCES partners (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
