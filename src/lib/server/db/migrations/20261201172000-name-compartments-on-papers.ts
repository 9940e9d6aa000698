import type { Migration } from '../table-migration';

/** A chamber that papers name: of its docket, since no truck has come to the door yet. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE compartments MODIFY visit_id UUID NULL, ADD COLUMN shipment_id UUID NULL, ' +
			'ADD UNIQUE KEY compartments_name (shipment_id, name), ' +
			'ADD CONSTRAINT compartments_shipment FOREIGN KEY (shipment_id) REFERENCES shipments (id)'
	);
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE compartments DROP FOREIGN KEY compartments_shipment, ' +
			'DROP KEY compartments_name, DROP COLUMN shipment_id, MODIFY visit_id UUID NOT NULL'
	);
};
