import { table } from '../table-migration';

/** A route with its findings grades and whether a logger must ride. */
export const { up, down } = table({
	name: 'lanes',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		name VARCHAR(120) NOT NULL,
		supplier_id UUID NULL,
		site_id UUID NOT NULL,
		is_logger_required BOOLEAN NOT NULL,
		finding_grades JSON NOT NULL,
		created_at DATETIME(3) NOT NULL,
		switched_off_at DATETIME(3) NULL,
		UNIQUE KEY lanes_name (name),
		FOREIGN KEY (supplier_id) REFERENCES partners (id),
		FOREIGN KEY (site_id) REFERENCES sites (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
