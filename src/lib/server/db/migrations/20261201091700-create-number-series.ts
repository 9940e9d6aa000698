import { table } from '../table-migration';

/** The last number given per site, year and kind; numbers are never reused. */
export const { up, down } = table({
	name: 'number_series',
	columns: `
		site_id UUID NOT NULL,
		year INT NOT NULL,
		kind ENUM ('docket', 'notice', 'claim') NOT NULL,
		last INT NOT NULL,
		PRIMARY KEY (site_id, year, kind),
		FOREIGN KEY (site_id) REFERENCES sites (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
