import { table } from '../table-migration';

/** The heads of all chains at one moment, chained. */
export const { up, down } = table({
	name: 'audit_checkpoints',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		seq INT NOT NULL,
		heads LONGTEXT NOT NULL,
		previous_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		made_at DATETIME(3) NOT NULL,
		UNIQUE KEY audit_checkpoints_seq (seq)
	`,
	grants: []
});
