import type { Migration } from '../table-migration';

/** What the authority table asks of people, products and trims; each table's right to update covers its new column. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE users ADD COLUMN is_qualified_person TINYINT(1) NOT NULL DEFAULT 0');
	await sequelize.query('ALTER TABLE products ADD COLUMN dock_may_accept TINYINT(1) NOT NULL DEFAULT 0');
	await sequelize.query('ALTER TABLE trims ADD COLUMN moved_recommendation TEXT NULL');
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE trims DROP COLUMN moved_recommendation');
	await sequelize.query('ALTER TABLE products DROP COLUMN dock_may_accept');
	await sequelize.query('ALTER TABLE users DROP COLUMN is_qualified_person');
};
