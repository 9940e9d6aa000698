import { table } from '../table-migration';

/** One change, chained to the one before. Append only. */
export const { up, down } = table({
	name: 'audit_entries',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		chain_id UUID NOT NULL,
		seq INT NOT NULL,
		type VARCHAR(60) NOT NULL,
		actor_id UUID NULL,
		actor_kind ENUM ('user', 'link', 'system') NOT NULL,
		occurred_at DATETIME(3) NOT NULL,
		request_id VARCHAR(40) NOT NULL,
		address VARCHAR(64) NOT NULL,
		payload_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		previous_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		UNIQUE KEY audit_entries_seq (chain_id, seq),
		KEY audit_entries_time (occurred_at),
		FOREIGN KEY (chain_id) REFERENCES audit_chains (id)
	`,
	grants: []
});
