import { table } from '../table-migration';

/** A file attached to a note. Append-only: what was attached stays attached. */
export const { up, down } = table({
	name: 'note_files',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		note_id UUID NOT NULL,
		file_id UUID NOT NULL,
		ordinal INT NOT NULL,
		file_name VARCHAR(200) NOT NULL,
		KEY note_files_note (note_id, ordinal),
		FOREIGN KEY (note_id) REFERENCES notes (id),
		FOREIGN KEY (file_id) REFERENCES files (id)
	`,
	grants: []
});
