import { table } from '../table-migration';

/** Facts about this installation, such as whether the demo was loaded. */
export const { up, down } = table({
	name: 'settings',
	columns: `
		name VARCHAR(60) NOT NULL PRIMARY KEY,
		value TEXT NOT NULL DEFAULT ''
	`,
	grants: ['UPDATE', 'DELETE']
});
