import { table } from '../table-migration';

/** Bytes by their hash. Written to the store before the row that names them. */
export const { up, down } = table({
	name: 'files',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		bytes BIGINT NOT NULL,
		media_type VARCHAR(100) NOT NULL,
		stored_at DATETIME(3) NOT NULL,
		UNIQUE KEY files_sha256 (sha256)
	`,
	grants: ['UPDATE', 'DELETE']
});
