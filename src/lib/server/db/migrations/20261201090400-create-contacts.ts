import { table } from '../table-migration';

/** A person at a partner. */
export const { up, down } = table({
	name: 'contacts',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		partner_id UUID NOT NULL,
		name VARCHAR(120) NOT NULL,
		email VARCHAR(254) NOT NULL,
		phone VARCHAR(40) NOT NULL,
		duty VARCHAR(80) NOT NULL,
		is_notified BOOLEAN NOT NULL,
		switched_off_at DATETIME(3) NULL,
		UNIQUE KEY contacts_email (partner_id, email),
		FOREIGN KEY (partner_id) REFERENCES partners (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
