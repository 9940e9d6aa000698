import { table } from '../table-migration';

/** A stretch that was not the journey, left out by a person. */
export const { up, down } = table({
	name: 'trims',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		trace_id UUID NOT NULL,
		from_at DATETIME(3) NOT NULL,
		to_at DATETIME(3) NOT NULL,
		reason VARCHAR(300) NOT NULL,
		made_by UUID NOT NULL,
		made_at DATETIME(3) NOT NULL,
		undone_by UUID NULL,
		undone_at DATETIME(3) NULL,
		FOREIGN KEY (trace_id) REFERENCES traces (id),
		FOREIGN KEY (made_by) REFERENCES users (id),
		FOREIGN KEY (undone_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
