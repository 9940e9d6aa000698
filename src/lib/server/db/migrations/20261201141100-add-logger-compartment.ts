import type { Migration } from '../table-migration';

/** The chamber a logger rode in where the load has several. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE logger_trips ADD COLUMN compartment_id UUID NULL, ' +
			'ADD CONSTRAINT logger_trips_compartment FOREIGN KEY (compartment_id) REFERENCES compartments (id)'
	);
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE logger_trips DROP FOREIGN KEY logger_trips_compartment, DROP COLUMN compartment_id'
	);
};
