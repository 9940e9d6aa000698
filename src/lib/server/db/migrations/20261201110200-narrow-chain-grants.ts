import type { Migration } from '../table-migration';

/** A chain's head moves on with each entry, so the app may update it; nothing takes a chain away. */
export const up: Migration['up'] = async ({ sequelize, database, appAccount }) => {
	if (!appAccount) return;
	await sequelize.query(`REVOKE DELETE ON \`${database}\`.audit_chains FROM ${appAccount}`);
};

export const down: Migration['down'] = async ({ sequelize, database, appAccount }) => {
	if (!appAccount) return;
	await sequelize.query(`GRANT DELETE ON \`${database}\`.audit_chains TO ${appAccount}`);
};
