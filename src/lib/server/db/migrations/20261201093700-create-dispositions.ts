import { table } from '../table-migration';

/** A signed decision. Versions; amended, never edited. */
export const { up, down } = table({
	name: 'dispositions',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		version INT NOT NULL,
		verdict ENUM ('accepted', 'conditions', 'part', 'rejected') NOT NULL,
		reasons TEXT NOT NULL DEFAULT '',
		amendment_reason TEXT NULL,
		meaning ENUM ('approval', 'review', 'authorship') NOT NULL,
		signed_by UUID NOT NULL,
		signed_name VARCHAR(120) NOT NULL,
		signed_title VARCHAR(120) NOT NULL,
		signed_at DATETIME(3) NOT NULL,
		zone VARCHAR(64) NOT NULL,
		frozen LONGTEXT NOT NULL,
		frozen_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		UNIQUE KEY dispositions_version (shipment_id, version),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (signed_by) REFERENCES users (id)
	`,
	grants: []
});
