import { table } from '../table-migration';

/** Evidence attached to a claim. */
export const { up, down } = table({
	name: 'claim_files',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		claim_id UUID NOT NULL,
		file_id UUID NOT NULL,
		what VARCHAR(200) NOT NULL,
		file_name VARCHAR(200) NOT NULL,
		attached_by UUID NOT NULL,
		attached_at DATETIME(3) NOT NULL,
		FOREIGN KEY (claim_id) REFERENCES claims (id),
		FOREIGN KEY (file_id) REFERENCES files (id),
		FOREIGN KEY (attached_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
