import { table } from '../table-migration';

/** What is bought; specs hang on it. */
export const { up, down } = table({
	name: 'products',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		name VARCHAR(120) NOT NULL,
		family VARCHAR(60) NOT NULL,
		count_unit VARCHAR(30) NOT NULL,
		created_at DATETIME(3) NOT NULL,
		switched_off_at DATETIME(3) NULL,
		UNIQUE KEY products_name (name)
	`,
	grants: ['UPDATE', 'DELETE']
});
