import { table } from '../table-migration';

/** Attempts in a window of time; kept here because the app holds no state. */
export const { up, down } = table({
	name: 'rate_limits',
	columns: `
		name VARCHAR(160) NOT NULL PRIMARY KEY,
		window_started_at DATETIME(3) NOT NULL,
		attempts INT NOT NULL DEFAULT 0
	`,
	grants: ['UPDATE', 'DELETE']
});
