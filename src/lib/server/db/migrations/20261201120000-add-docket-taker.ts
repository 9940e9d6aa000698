import type { Migration } from '../table-migration';

/** Who has taken a waiting docket on; the right to update the table covers its new columns. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE shipments ADD COLUMN taken_by UUID NULL, ADD COLUMN taken_at DATETIME(3) NULL, ' +
			'ADD CONSTRAINT shipments_taken_by FOREIGN KEY (taken_by) REFERENCES users (id)'
	);
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE shipments DROP FOREIGN KEY shipments_taken_by, DROP COLUMN taken_by, DROP COLUMN taken_at'
	);
};
