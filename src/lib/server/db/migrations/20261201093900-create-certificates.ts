import { table } from '../table-migration';

/** The organisation's sealing certificates; the keys lie in the key folder. */
export const { up, down } = table({
	name: 'certificates',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		organisation_id UUID NOT NULL,
		subject VARCHAR(300) NOT NULL,
		serial VARCHAR(64) NOT NULL,
		sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		pem TEXT NOT NULL DEFAULT '',
		valid_from DATETIME(3) NOT NULL,
		valid_until DATETIME(3) NOT NULL,
		created_at DATETIME(3) NOT NULL,
		retired_at DATETIME(3) NULL,
		UNIQUE KEY certificates_sha256 (sha256),
		FOREIGN KEY (organisation_id) REFERENCES organisations (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
