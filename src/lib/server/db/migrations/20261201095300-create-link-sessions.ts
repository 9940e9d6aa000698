import { table } from '../table-migration';

/** A revocable session opened by a mailed link, for one docket and one contact. */
export const { up, down } = table({
	name: 'link_sessions',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		contact_id UUID NOT NULL,
		partner_id UUID NOT NULL,
		shipment_id UUID NOT NULL,
		created_at DATETIME(3) NOT NULL,
		expires_at DATETIME(3) NOT NULL,
		revoked_at DATETIME(3) NULL,
		FOREIGN KEY (contact_id) REFERENCES contacts (id),
		FOREIGN KEY (partner_id) REFERENCES partners (id),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
