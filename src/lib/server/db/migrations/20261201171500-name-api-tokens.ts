import type { Migration } from '../table-migration';

/** What a token is for, in its owner's words: whoever revokes one must know which program falls silent. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query("ALTER TABLE api_tokens ADD COLUMN name VARCHAR(80) NOT NULL DEFAULT ''");
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE api_tokens DROP COLUMN name');
};
