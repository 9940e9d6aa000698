import type { Migration } from '../table-migration';

/**
 * A signed version never changes, whoever asks: the app's account may write what a signature adds to a version, but
 * may not touch its figures, its hash or its number. A draft with other figures is a new row.
 */
const written = 'state, reason, signed_by, signed_at, in_force_from, superseded_at';

export const up: Migration['up'] = async ({ sequelize, database, appAccount }) => {
	if (!appAccount) return;
	const table = `\`${database}\`.spec_versions`;
	await sequelize.query(`REVOKE UPDATE ON ${table} FROM ${appAccount}`);
	await sequelize.query(`GRANT UPDATE (${written}) ON ${table} TO ${appAccount}`);
};

export const down: Migration['down'] = async ({ sequelize, database, appAccount }) => {
	if (!appAccount) return;
	const table = `\`${database}\`.spec_versions`;
	await sequelize.query(`REVOKE UPDATE (${written}) ON ${table} FROM ${appAccount}`);
	await sequelize.query(`GRANT UPDATE ON ${table} TO ${appAccount}`);
};
