import type { Migration } from '../table-migration';

/** How whoever acted had come in. Entries from before have none, and their hashes cover none. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE audit_entries ADD COLUMN session_kind VARCHAR(12) NULL AFTER actor_kind'
	);
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query('ALTER TABLE audit_entries DROP COLUMN session_kind');
};
