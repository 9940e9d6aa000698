import { table } from '../table-migration';

/** A logistic unit of a line. */
export const { up, down } = table({
	name: 'pallets',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		line_id UUID NOT NULL,
		ordinal INT NOT NULL,
		sscc CHAR(18) CHARACTER SET ascii NULL,
		cases INT NOT NULL,
		whereabouts VARCHAR(80) NULL,
		KEY pallets_sscc (sscc),
		FOREIGN KEY (line_id) REFERENCES shipment_lines (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
