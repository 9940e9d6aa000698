import { table } from '../table-migration';

/** A secret by which another program acts as a user, kept as its hash until it is revoked. */
export const { up, down } = table({
	name: 'api_tokens',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		user_id UUID NOT NULL,
		token_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		created_at DATETIME(3) NOT NULL,
		last_used_at DATETIME(3) NULL,
		revoked_at DATETIME(3) NULL,
		UNIQUE KEY api_tokens_hash (token_sha256),
		FOREIGN KEY (user_id) REFERENCES users (id)
	`,
	grants: ['UPDATE']
});
