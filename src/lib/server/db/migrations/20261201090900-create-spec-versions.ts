import { table } from '../table-migration';

/** A numbered version of a product's shelf-life model and limits. A signed version never changes. */
export const { up, down } = table({
	name: 'spec_versions',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		product_id UUID NOT NULL,
		variety_id UUID NULL,
		number INT NOT NULL,
		state ENUM ('draft', 'signed') NOT NULL,
		figures LONGTEXT NOT NULL,
		figures_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		reason TEXT NOT NULL DEFAULT '',
		created_by UUID NULL,
		created_at DATETIME(3) NOT NULL,
		signed_by UUID NULL,
		signed_at DATETIME(3) NULL,
		in_force_from DATETIME(3) NULL,
		superseded_at DATETIME(3) NULL,
		UNIQUE KEY spec_versions_number (product_id, variety_id, number),
		KEY spec_versions_force (product_id, state, in_force_from),
		FOREIGN KEY (product_id) REFERENCES products (id),
		FOREIGN KEY (variety_id) REFERENCES varieties (id),
		FOREIGN KEY (created_by) REFERENCES users (id),
		FOREIGN KEY (signed_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
