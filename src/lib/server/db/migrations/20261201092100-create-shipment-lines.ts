import { table } from '../table-migration';

/** A product and lot under the papers. */
export const { up, down } = table({
	name: 'shipment_lines',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		ordinal INT NOT NULL,
		product_id UUID NOT NULL,
		variety_id UUID NULL,
		description VARCHAR(160) NOT NULL,
		lot VARCHAR(60) NOT NULL,
		gtin CHAR(14) CHARACTER SET ascii NULL,
		cases_advised INT NOT NULL,
		cases_received INT NULL,
		pallets_advised INT NOT NULL,
		gross_grams BIGINT NULL,
		value_minor BIGINT NULL,
		currency CHAR(3) CHARACTER SET ascii NULL,
		best_before_on DATE NULL,
		needed_hours DOUBLE NULL,
		opening_kind ENUM ('undeclared', 'declared', 'computed') NOT NULL,
		opening_hours DOUBLE NULL,
		opening_plus_minus_hours DOUBLE NULL,
		opening_since_at DATETIME(3) NULL,
		opening_celsius DOUBLE NULL,
		opening_basis VARCHAR(200) NULL,
		UNIQUE KEY shipment_lines_ordinal (shipment_id, ordinal),
		KEY shipment_lines_lot (lot),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (product_id) REFERENCES products (id),
		FOREIGN KEY (variety_id) REFERENCES varieties (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
