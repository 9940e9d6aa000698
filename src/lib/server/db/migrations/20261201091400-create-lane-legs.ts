import { table } from '../table-migration';

/** A planned leg of a lane with its allowance. */
export const { up, down } = table({
	name: 'lane_legs',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		lane_id UUID NOT NULL,
		ordinal INT NOT NULL,
		holder_id UUID NULL,
		place VARCHAR(120) NOT NULL,
		planned_minutes INT NOT NULL,
		set_point_celsius DOUBLE NULL,
		allowed_hours DOUBLE NULL,
		UNIQUE KEY lane_legs_ordinal (lane_id, ordinal),
		FOREIGN KEY (lane_id) REFERENCES lanes (id),
		FOREIGN KEY (holder_id) REFERENCES partners (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
