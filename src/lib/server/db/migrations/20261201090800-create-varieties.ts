import { table } from '../table-migration';

/** A variety or pack of a product with a spec of its own. */
export const { up, down } = table({
	name: 'varieties',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		product_id UUID NOT NULL,
		name VARCHAR(120) NOT NULL,
		UNIQUE KEY varieties_name (product_id, name),
		FOREIGN KEY (product_id) REFERENCES products (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
