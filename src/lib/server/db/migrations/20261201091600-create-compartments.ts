import { table } from '../table-migration';

/** A chamber of a trailer with its own set-point. */
export const { up, down } = table({
	name: 'compartments',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		visit_id UUID NOT NULL,
		name VARCHAR(40) NOT NULL,
		set_point_celsius DOUBLE NULL,
		supply_air_celsius DOUBLE NULL,
		return_air_celsius DOUBLE NULL,
		FOREIGN KEY (visit_id) REFERENCES visits (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
