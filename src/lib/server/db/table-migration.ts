import type { Sequelize } from 'sequelize';

/** What every migration gets: the owner's connection, and the account the app runs under, quoted for GRANT. */
export interface MigrationContext {
	sequelize: Sequelize;
	database: string;
	/** Null when owner and app are one account: then there is nothing to grant. */
	appAccount: string | null;
}

export interface Migration {
	up: (context: MigrationContext) => Promise<void>;
	down: (context: MigrationContext) => Promise<void>;
}

interface Table {
	name: string;
	columns: string;
	/** What the app may do beyond SELECT and INSERT, which the schema grants. Append-only tables get nothing. */
	grants: readonly ('UPDATE' | 'DELETE')[];
}

/** A migration that makes one table and says what the app may do with its rows. */
export function table({ name, columns, grants }: Table): Migration {
	return {
		async up({ sequelize, database, appAccount }) {
			await sequelize.query(`CREATE TABLE ${name} (${columns}) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`);
			if (!appAccount || grants.length === 0) return;
			await sequelize.query(`GRANT ${grants.join(', ')} ON \`${database}\`.${name} TO ${appAccount}`);
		},
		async down({ sequelize }) {
			await sequelize.query(`DROP TABLE ${name}`);
		}
	};
}
