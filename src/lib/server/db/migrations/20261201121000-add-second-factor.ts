import type { Migration } from '../table-migration';

/**
 * A second factor of an account, and in which session its holder last showed every component of the signature; the
 * right to update the table covers its new columns.
 */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE users ADD COLUMN second_factor_sealed VARCHAR(255) NULL, ' +
			'ADD COLUMN second_factor_since DATETIME(3) NULL, ' +
			'ADD COLUMN second_factor_step BIGINT NULL, ' +
			'ADD COLUMN signing_session_id UUID NULL, ' +
			'ADD COLUMN signing_session_at DATETIME(3) NULL'
	);
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE users DROP COLUMN second_factor_sealed, DROP COLUMN second_factor_since, ' +
			'DROP COLUMN second_factor_step, DROP COLUMN signing_session_id, DROP COLUMN signing_session_at'
	);
};
