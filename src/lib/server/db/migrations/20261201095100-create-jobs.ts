import { table } from '../table-migration';

/** Work written in the transaction that causes it; leased by a worker, retried, never lost. */
export const { up, down } = table({
	name: 'jobs',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		kind VARCHAR(40) NOT NULL,
		payload LONGTEXT NOT NULL,
		dedupe_key VARCHAR(120) NULL,
		run_at DATETIME(3) NOT NULL,
		attempts INT NOT NULL DEFAULT 0,
		leased_by VARCHAR(80) NULL,
		leased_until DATETIME(3) NULL,
		done_at DATETIME(3) NULL,
		failed_at DATETIME(3) NULL,
		last_error TEXT NULL,
		created_at DATETIME(3) NOT NULL,
		UNIQUE KEY jobs_dedupe (dedupe_key),
		KEY jobs_due (done_at, failed_at, run_at)
	`,
	grants: ['UPDATE', 'DELETE']
});
