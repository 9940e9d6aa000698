import { table } from '../table-migration';

/** A row of a claim's valuation. */
export const { up, down } = table({
	name: 'claim_items',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		claim_id UUID NOT NULL,
		ordinal INT NOT NULL,
		text VARCHAR(200) NOT NULL,
		quantity DOUBLE NOT NULL,
		quantity_unit VARCHAR(30) NOT NULL,
		each_minor BIGINT NOT NULL,
		amount_minor BIGINT NOT NULL,
		FOREIGN KEY (claim_id) REFERENCES claims (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
