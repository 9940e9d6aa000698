import { table } from '../table-migration';

/** Answers remembered for files of one make. */
export const { up, down } = table({
	name: 'layouts',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		fingerprint CHAR(64) CHARACTER SET ascii NOT NULL,
		version INT NOT NULL,
		partner_id UUID NULL,
		answers JSON NOT NULL,
		confirmed_by UUID NOT NULL,
		confirmed_at DATETIME(3) NOT NULL,
		withdrawn_at DATETIME(3) NULL,
		UNIQUE KEY layouts_version (fingerprint, partner_id, version),
		FOREIGN KEY (partner_id) REFERENCES partners (id),
		FOREIGN KEY (confirmed_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
