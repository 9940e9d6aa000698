import type { Migration } from '../table-migration';

/** How much of a chain the checkpoints cover; a longer chain goes into the next one. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE audit_chains ADD COLUMN checkpointed_length INT NOT NULL DEFAULT 0');
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE audit_chains DROP COLUMN checkpointed_length');
};
