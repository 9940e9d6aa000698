import { table } from '../table-migration';

/** A supplier, carrier, store or customer. */
export const { up, down } = table({
	name: 'partners',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		name VARCHAR(120) NOT NULL,
		is_supplier BOOLEAN NOT NULL,
		is_carrier BOOLEAN NOT NULL,
		is_store BOOLEAN NOT NULL,
		is_customer BOOLEAN NOT NULL,
		gln CHAR(13) CHARACTER SET ascii NULL,
		address VARCHAR(300) NOT NULL,
		country_code CHAR(2) CHARACTER SET ascii NULL,
		note TEXT NOT NULL DEFAULT '',
		created_at DATETIME(3) NOT NULL,
		switched_off_at DATETIME(3) NULL,
		UNIQUE KEY partners_name (name)
	`,
	grants: ['UPDATE', 'DELETE']
});
