import { table } from '../table-migration';

/** The recommendation for one line, with its reasons. */
export const { up, down } = table({
	name: 'line_recommendations',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		line_id UUID NOT NULL,
		recommended ENUM ('accept', 'hold', 'reject') NOT NULL,
		reasons LONGTEXT NOT NULL,
		made_at DATETIME(3) NOT NULL,
		UNIQUE KEY line_recommendations_line (line_id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (line_id) REFERENCES shipment_lines (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
