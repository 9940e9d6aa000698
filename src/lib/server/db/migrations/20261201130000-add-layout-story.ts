import type { Migration } from '../table-migration';

/** Where a remembered layout comes from, and who let it go; the right to update the table covers its new columns. */
export const up: Migration['up'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE layouts ADD COLUMN source_read_id UUID NULL, ADD COLUMN source_name VARCHAR(180) NULL, ' +
			'ADD COLUMN withdrawn_by UUID NULL, ADD COLUMN withdrawn_reason VARCHAR(300) NULL, ' +
			'ADD CONSTRAINT layouts_withdrawn_by FOREIGN KEY (withdrawn_by) REFERENCES users (id)'
	);
};

export const down: Migration['down'] = async ({ sequelize }) => {
	await sequelize.query(
		'ALTER TABLE layouts DROP FOREIGN KEY layouts_withdrawn_by, DROP COLUMN source_read_id, ' +
			'DROP COLUMN source_name, DROP COLUMN withdrawn_by, DROP COLUMN withdrawn_reason'
	);
};
