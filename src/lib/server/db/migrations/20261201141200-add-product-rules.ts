import type { Migration } from '../table-migration';

/** What a product makes of findings, and what its customers ask of printed dates. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query(
		"ALTER TABLE products ADD COLUMN finding_grades JSON NOT NULL DEFAULT '{}', " +
			'ADD COLUMN minimum_dated_days INT NULL, ' +
			'ADD COLUMN is_not_older_than_last BOOLEAN NOT NULL DEFAULT FALSE, ' +
			'ADD COLUMN is_logger_required BOOLEAN NOT NULL DEFAULT FALSE'
	);
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE products DROP COLUMN finding_grades, DROP COLUMN minimum_dated_days, ' +
			'DROP COLUMN is_not_older_than_last, DROP COLUMN is_logger_required'
	);
};
