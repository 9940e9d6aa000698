import type { Migration } from '../table-migration';

/** Retention blanks a payload's text; which entry it belongs to is nobody's to change. */
export const up: Migration['up'] = async ({ sequelize, database, appAccount }) => {
	if (!appAccount) return;
	const table = `\`${database}\`.audit_payloads`;
	await sequelize.query(`REVOKE UPDATE ON ${table} FROM ${appAccount}`);
	await sequelize.query(`GRANT UPDATE (text) ON ${table} TO ${appAccount}`);
};

export const down: Migration['down'] = async ({ sequelize, database, appAccount }) => {
	if (!appAccount) return;
	const table = `\`${database}\`.audit_payloads`;
	await sequelize.query(`REVOKE UPDATE (text) ON ${table} FROM ${appAccount}`);
	await sequelize.query(`GRANT UPDATE ON ${table} TO ${appAccount}`);
};
