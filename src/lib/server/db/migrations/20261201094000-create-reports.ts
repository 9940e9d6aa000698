import { table } from '../table-migration';

/** The sealed receiving report of a signed decision. */
export const { up, down } = table({
	name: 'reports',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		disposition_id UUID NOT NULL,
		shipment_id UUID NOT NULL,
		file_id UUID NOT NULL,
		file_name VARCHAR(120) NOT NULL,
		certificate_id UUID NOT NULL,
		made_at DATETIME(3) NOT NULL,
		UNIQUE KEY reports_disposition (disposition_id),
		FOREIGN KEY (disposition_id) REFERENCES dispositions (id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (file_id) REFERENCES files (id),
		FOREIGN KEY (certificate_id) REFERENCES certificates (id)
	`,
	grants: []
});
