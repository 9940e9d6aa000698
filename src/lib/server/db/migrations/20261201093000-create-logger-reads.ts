import { table } from '../table-migration';

/** One uploaded export on one docket. */
export const { up, down } = table({
	name: 'logger_reads',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		file_id UUID NOT NULL,
		part INT NOT NULL,
		file_name VARCHAR(200) NOT NULL,
		state ENUM ('question', 'ok', 'refused', 'withdrawn') NOT NULL,
		answers JSON NOT NULL,
		layout_id UUID NULL,
		understanding LONGTEXT NULL,
		refusal_code VARCHAR(40) NULL,
		reader_version VARCHAR(20) NOT NULL,
		zone_data_version VARCHAR(20) NULL,
		uploaded_by UUID NOT NULL,
		uploaded_at DATETIME(3) NOT NULL,
		kept_at DATETIME(3) NULL,
		asked_qa_at DATETIME(3) NULL,
		UNIQUE KEY logger_reads_part (shipment_id, file_id, part),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (file_id) REFERENCES files (id),
		FOREIGN KEY (layout_id) REFERENCES layouts (id),
		FOREIGN KEY (uploaded_by) REFERENCES users (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
