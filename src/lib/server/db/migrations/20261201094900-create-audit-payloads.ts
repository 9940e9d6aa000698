import { table } from '../table-migration';

/** The stored text an entry hashes; blanked by retention, and the chain still verifies. */
export const { up, down } = table({
	name: 'audit_payloads',
	columns: `
		entry_id UUID NOT NULL PRIMARY KEY,
		text LONGTEXT NULL,
		FOREIGN KEY (entry_id) REFERENCES audit_entries (id)
	`,
	grants: ['UPDATE']
});
