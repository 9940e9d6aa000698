import type { Migration } from '../table-migration';

/** How far an assumed temperature may be off, and the chamber a line rode in where the load has several. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE shipment_lines ADD COLUMN opening_plus_minus_celsius DOUBLE NULL, ' +
			'ADD COLUMN compartment_id UUID NULL, ' +
			'ADD CONSTRAINT shipment_lines_compartment FOREIGN KEY (compartment_id) REFERENCES compartments (id)'
	);
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE shipment_lines DROP FOREIGN KEY shipment_lines_compartment, ' +
			'DROP COLUMN compartment_id, DROP COLUMN opening_plus_minus_celsius'
	);
};
