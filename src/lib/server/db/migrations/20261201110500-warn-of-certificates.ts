import type { Migration } from '../table-migration';

/** When the admins were told that a certificate ends: they are told once. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE certificates ADD COLUMN warned_at DATETIME(3) NULL');
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE certificates DROP COLUMN warned_at');
};
