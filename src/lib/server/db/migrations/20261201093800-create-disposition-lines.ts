import { table } from '../table-migration';

/** The outcome of one line in a signed decision. */
export const { up, down } = table({
	name: 'disposition_lines',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		disposition_id UUID NOT NULL,
		line_id UUID NOT NULL,
		outcome ENUM ('accept', 'conditions', 'hold', 'reject') NOT NULL,
		cases INT NOT NULL,
		pallets INT NOT NULL,
		condition_text VARCHAR(400) NULL,
		reason VARCHAR(400) NULL,
		assessment_id UUID NULL,
		KEY disposition_lines_disposition (disposition_id),
		FOREIGN KEY (disposition_id) REFERENCES dispositions (id),
		FOREIGN KEY (line_id) REFERENCES shipment_lines (id),
		FOREIGN KEY (assessment_id) REFERENCES assessments (id)
	`,
	grants: []
});
