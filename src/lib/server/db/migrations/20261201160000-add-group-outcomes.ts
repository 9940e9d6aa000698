import type { Migration } from '../table-migration';

/** A line is decided by groups, and a hold says what it waits for; each table's rights cover its new columns. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query(
		`ALTER TABLE disposition_lines
			ADD COLUMN ordinal INT NOT NULL DEFAULT 1,
			ADD COLUMN name VARCHAR(80) NOT NULL DEFAULT '',
			ADD COLUMN condition_kind ENUM ('shorter-date', 'sort-rework', 'use-first', 'nearer-customer', 'concession') NULL,
			ADD COLUMN whereabouts ENUM ('dock', 'store', 'quarantine', 'returned', 'dumped') NULL,
			ADD COLUMN place VARCHAR(80) NULL,
			ADD COLUMN awaited VARCHAR(400) NULL,
			ADD COLUMN until_at DATETIME(3) NULL`
	);
	await sequelize.query(
		'ALTER TABLE holds ADD COLUMN awaited VARCHAR(400) NULL, ADD COLUMN until_at DATETIME(3) NULL'
	);
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE holds DROP COLUMN until_at, DROP COLUMN awaited');
	await sequelize.query(
		'ALTER TABLE disposition_lines DROP COLUMN until_at, DROP COLUMN awaited, DROP COLUMN place, ' +
			'DROP COLUMN whereabouts, DROP COLUMN condition_kind, DROP COLUMN name, DROP COLUMN ordinal'
	);
};
