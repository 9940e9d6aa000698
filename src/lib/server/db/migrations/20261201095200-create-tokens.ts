import { table } from '../table-migration';

/** A secret sent by mail, kept as its hash, used once. */
export const { up, down } = table({
	name: 'tokens',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		kind ENUM ('sign-in', 'invitation', 'notice') NOT NULL,
		token_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		user_id UUID NULL,
		contact_id UUID NULL,
		shipment_id UUID NULL,
		notice_id UUID NULL,
		created_at DATETIME(3) NOT NULL,
		expires_at DATETIME(3) NOT NULL,
		used_at DATETIME(3) NULL,
		UNIQUE KEY tokens_hash (token_sha256),
		FOREIGN KEY (user_id) REFERENCES users (id),
		FOREIGN KEY (contact_id) REFERENCES contacts (id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (notice_id) REFERENCES notices (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
