import { table } from '../table-migration';

/** A receiving place: its zone, units and number prefix. */
export const { up, down } = table({
	name: 'sites',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		organisation_id UUID NOT NULL,
		code VARCHAR(8) NOT NULL,
		name VARCHAR(120) NOT NULL,
		address VARCHAR(300) NOT NULL,
		gln CHAR(13) CHARACTER SET ascii NULL,
		zone VARCHAR(64) NOT NULL,
		temperature_unit ENUM ('celsius', 'fahrenheit') NOT NULL,
		page_size ENUM ('a4', 'letter') NOT NULL,
		currency CHAR(3) CHARACTER SET ascii NOT NULL,
		opening JSON NOT NULL,
		docks JSON NOT NULL,
		created_at DATETIME(3) NOT NULL,
		switched_off_at DATETIME(3) NULL,
		UNIQUE KEY sites_code (code),
		FOREIGN KEY (organisation_id) REFERENCES organisations (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
