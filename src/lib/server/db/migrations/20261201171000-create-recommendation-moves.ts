import { table } from '../table-migration';

/** A correction of handovers, papers, pulp or reads that moved what is recommended, with both figures. Append-only. */
export const { up, down } = table({
	name: 'recommendation_moves',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		kind ENUM ('handover', 'papers', 'pulp', 'read') NOT NULL,
		made_by UUID NOT NULL,
		made_at DATETIME(3) NOT NULL,
		moved TEXT NOT NULL,
		KEY recommendation_moves_shipment (shipment_id, made_at),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (made_by) REFERENCES users (id)
	`,
	grants: []
});
