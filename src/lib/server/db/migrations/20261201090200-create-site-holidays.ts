import { table } from '../table-migration';

/** Days on which a site does not work. */
export const { up, down } = table({
	name: 'site_holidays',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		site_id UUID NOT NULL,
		held_on DATE NOT NULL,
		name VARCHAR(120) NOT NULL,
		UNIQUE KEY site_holidays_day (site_id, held_on),
		FOREIGN KEY (site_id) REFERENCES sites (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
