import { table } from '../table-migration';

/** A message to a partner about a decision. */
export const { up, down } = table({
	name: 'notices',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		number VARCHAR(24) NOT NULL,
		shipment_id UUID NOT NULL,
		disposition_id UUID NOT NULL,
		partner_id UUID NOT NULL,
		contact_id UUID NULL,
		state ENUM ('queued', 'sent', 'failed') NOT NULL,
		subject VARCHAR(300) NOT NULL,
		answer_by_at DATETIME(3) NULL,
		created_at DATETIME(3) NOT NULL,
		sent_at DATETIME(3) NULL,
		message_id VARCHAR(200) NULL,
		first_opened_at DATETIME(3) NULL,
		UNIQUE KEY notices_number (number),
		UNIQUE KEY notices_once (disposition_id, partner_id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (disposition_id) REFERENCES dispositions (id),
		FOREIGN KEY (partner_id) REFERENCES partners (id),
		FOREIGN KEY (contact_id) REFERENCES contacts (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
