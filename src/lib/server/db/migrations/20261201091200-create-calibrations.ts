import { table } from '../table-migration';

/** A check of an instrument against a reference. */
export const { up, down } = table({
	name: 'calibrations',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		logger_id UUID NOT NULL,
		calibrated_on DATE NOT NULL,
		due_on DATE NOT NULL,
		certificate_number VARCHAR(60) NOT NULL,
		laboratory VARCHAR(120) NOT NULL,
		error_celsius DOUBLE NULL,
		file_id UUID NULL,
		FOREIGN KEY (logger_id) REFERENCES loggers (id),
		FOREIGN KEY (file_id) REFERENCES files (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
