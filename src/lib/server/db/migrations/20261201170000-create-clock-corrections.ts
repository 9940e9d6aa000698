import { table } from '../table-migration';

/** A logger's clock put right by a person; the readings as exported stay what they are. */
export const { up, down } = table({
	name: 'clock_corrections',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		read_id UUID NOT NULL,
		shift_ms BIGINT NOT NULL,
		reason VARCHAR(300) NOT NULL,
		made_by UUID NOT NULL,
		made_at DATETIME(3) NOT NULL,
		undone_by UUID NULL,
		undone_at DATETIME(3) NULL,
		moved_recommendation TEXT NULL,
		FOREIGN KEY (read_id) REFERENCES logger_reads (id),
		FOREIGN KEY (made_by) REFERENCES users (id),
		FOREIGN KEY (undone_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
