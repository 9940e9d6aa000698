import { table } from '../table-migration';

/** The sites a user works at. */
export const { up, down } = table({
	name: 'user_sites',
	columns: `
		user_id UUID NOT NULL,
		site_id UUID NOT NULL,
		PRIMARY KEY (user_id, site_id),
		FOREIGN KEY (user_id) REFERENCES users (id),
		FOREIGN KEY (site_id) REFERENCES sites (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
