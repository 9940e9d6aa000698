import { QueryTypes } from 'sequelize';
import { Umzug } from 'umzug';
import { connect } from './sequelize';
import type { Migration, MigrationContext } from './table-migration';

const files = import.meta.glob<Migration>('./migrations/*.ts', { eager: true });

function migrations() {
	return Object.entries(files)
		.map(([path, { up, down }]) => ({
			name: path.replace(/^.*\//, '').replace(/\.ts$/, ''),
			up: ({ context }: { context: MigrationContext }) => up(context),
			down: ({ context }: { context: MigrationContext }) => down(context)
		}))
		.sort((a, b) => a.name.localeCompare(b.name));
}

/** Remembers what ran in a table of its own, written by the owner. */
const storage = {
	async executed({ context: { sequelize } }: { context: MigrationContext }): Promise<string[]> {
		await sequelize.query(
			'CREATE TABLE IF NOT EXISTS migrations (name VARCHAR(120) PRIMARY KEY, ran_at DATETIME(3) NOT NULL)'
		);
		const rows = await sequelize.query<{ name: string }>('SELECT name FROM migrations ORDER BY name', {
			type: QueryTypes.SELECT
		});
		return rows.map((row) => row.name);
	},
	async logMigration({ name, context }: { name: string; context: MigrationContext }) {
		await context.sequelize.query('INSERT INTO migrations (name, ran_at) VALUES (?, UTC_TIMESTAMP(3))', {
			replacements: [name]
		});
	},
	async unlogMigration({ name, context }: { name: string; context: MigrationContext }) {
		await context.sequelize.query('DELETE FROM migrations WHERE name = ?', { replacements: [name] });
	}
};

/** The account behind the app's URL as the server names it, quoted for GRANT. */
export async function accountOf(appUrl: string): Promise<string> {
	// Before the first grant the account may open no schema but this one.
	const url = new URL(appUrl);
	url.pathname = '/information_schema';
	const app = connect(url.href, 1);
	try {
		const [row] = await app.query<{ account: string }>('SELECT CURRENT_USER() AS account', {
			type: QueryTypes.SELECT
		});
		const [user, host] = (row?.account ?? '').split('@');
		return `'${user}'@'${host}'`;
	} finally {
		await app.close();
	}
}

/**
 * Brings the schema to the newest version and grants the app what each table allows.
 * @returns names of the migrations that ran.
 */
export async function migrate(ownerUrl: string, appUrl: string): Promise<string[]> {
	const sequelize = connect(ownerUrl, 1);
	try {
		const name = new URL(ownerUrl).pathname.slice(1);
		const appAccount = ownerUrl === appUrl ? null : await accountOf(appUrl);
		if (appAccount) await sequelize.query(`GRANT SELECT, INSERT ON \`${name}\`.* TO ${appAccount}`);
		const context: MigrationContext = { sequelize, database: name, appAccount };
		const umzug = new Umzug({ migrations: migrations(), context, storage, logger: undefined });
		return (await umzug.up()).map((ran) => ran.name);
	} finally {
		await sequelize.close();
	}
}
