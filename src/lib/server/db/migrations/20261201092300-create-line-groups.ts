import { table } from '../table-migration';

/** Pallets or cases of a line with one outcome and one whereabouts. */
export const { up, down } = table({
	name: 'line_groups',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		line_id UUID NOT NULL,
		ordinal INT NOT NULL,
		name VARCHAR(80) NOT NULL,
		cases INT NOT NULL,
		pallets INT NOT NULL,
		whereabouts ENUM ('dock', 'store', 'quarantine', 'returned', 'dumped') NOT NULL,
		place VARCHAR(80) NOT NULL,
		FOREIGN KEY (line_id) REFERENCES shipment_lines (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
