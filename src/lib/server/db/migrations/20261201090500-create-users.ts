import { table } from '../table-migration';

/** Somebody who signs in. */
export const { up, down } = table({
	name: 'users',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		email VARCHAR(254) NOT NULL,
		name VARCHAR(120) NOT NULL,
		title VARCHAR(120) NOT NULL,
		password_hash VARCHAR(255) NULL,
		roles JSON NOT NULL,
		partner_id UUID NULL,
		token_version INT NOT NULL DEFAULT 0,
		failed_passwords INT NOT NULL DEFAULT 0,
		locked_at DATETIME(3) NULL,
		temperature_unit ENUM ('celsius', 'fahrenheit') NULL,
		created_at DATETIME(3) NOT NULL,
		invited_at DATETIME(3) NULL,
		last_sign_in_at DATETIME(3) NULL,
		switched_off_at DATETIME(3) NULL,
		UNIQUE KEY users_email (email),
		FOREIGN KEY (partner_id) REFERENCES partners (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
