import { table } from '../table-migration';

/** The receiver that runs this installation. One per database. */
export const { up, down } = table({
	name: 'organisations',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		name VARCHAR(120) NOT NULL,
		country_code CHAR(2) CHARACTER SET ascii NOT NULL,
		created_at DATETIME(3) NOT NULL
	`,
	grants: ['UPDATE', 'DELETE']
});
