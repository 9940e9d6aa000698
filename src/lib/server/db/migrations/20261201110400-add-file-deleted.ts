import type { Migration } from '../table-migration';

/** When retention took a file's bytes away; its row and hash stay. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE files ADD COLUMN deleted_at DATETIME(3) NULL');
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE files DROP COLUMN deleted_at');
};
