import { table } from '../table-migration';

/** What a partner answered. */
export const { up, down } = table({
	name: 'notice_answers',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		notice_id UUID NOT NULL,
		kind ENUM ('acknowledge', 'dispute') NOT NULL,
		disputed JSON NOT NULL,
		what_is_wrong TEXT NOT NULL DEFAULT '',
		what_will_be_done TEXT NOT NULL DEFAULT '',
		who VARCHAR(120) NOT NULL,
		done_by_on DATE NULL,
		file_id UUID NULL,
		answered_by VARCHAR(254) NOT NULL,
		answered_at DATETIME(3) NOT NULL,
		FOREIGN KEY (notice_id) REFERENCES notices (id),
		FOREIGN KEY (file_id) REFERENCES files (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
