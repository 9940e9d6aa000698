import { QueryTypes, type Sequelize } from 'sequelize';
import { BackupFault, type Grant } from './manifest';

/** What the app's own account may do table by table, as it sees itself. */
export async function grantsOfApp(app: Sequelize): Promise<Grant[]> {
	return app.query<Grant>(
		`SELECT table_name AS \`table\`, privilege_type AS privilege, NULL AS \`column\`
			FROM information_schema.table_privileges WHERE table_schema = DATABASE()
		UNION SELECT table_name, privilege_type, column_name
			FROM information_schema.column_privileges WHERE table_schema = DATABASE()
		ORDER BY 1, 2, 3`,
		{ type: QueryTypes.SELECT }
	);
}

const isName = (text: string) => /^[A-Za-z0-9_]+$/.test(text);

/** Gives the app's account of another server the same rights. */
export async function grantToApp(
	owner: Sequelize,
	database: string,
	account: string,
	grants: readonly Grant[]
): Promise<void> {
	await owner.query(`GRANT SELECT, INSERT ON \`${database}\`.* TO ${account}`);
	for (const { table, privilege, column } of grants) {
		if (!isName(table) || !/^[A-Z ]+$/.test(privilege) || (column !== null && !isName(column)))
			throw new BackupFault(`The backup names a grant that is none: ${privilege} on ${table}.`);
		const what = column === null ? privilege : `${privilege} (${column})`;
		await owner.query(`GRANT ${what} ON \`${database}\`.${table} TO ${account}`);
	}
}
