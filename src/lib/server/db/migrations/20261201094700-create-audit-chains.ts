import { table } from '../table-migration';

/** The head of one hash chain: a docket's, else a site's or an account's. */
export const { up, down } = table({
	name: 'audit_chains',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		scope ENUM ('shipment', 'site', 'account', 'organisation') NOT NULL,
		length INT NOT NULL DEFAULT 0,
		head_sha256 CHAR(64) CHARACTER SET ascii NOT NULL
	`,
	grants: ['UPDATE', 'DELETE']
});
