import { table } from '../table-migration';

/** What one trace says about one line. Recomputed freely until signed. */
export const { up, down } = table({
	name: 'assessments',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		shipment_id UUID NOT NULL,
		line_id UUID NOT NULL,
		trace_id UUID NOT NULL,
		spec_version_id UUID NOT NULL,
		engine_version VARCHAR(20) NOT NULL,
		inputs_sha256 CHAR(64) CHARACTER SET ascii NOT NULL,
		figures LONGTEXT NOT NULL,
		remaining_hours DOUBLE NOT NULL,
		remaining_low_hours DOUBLE NOT NULL,
		remaining_high_hours DOUBLE NOT NULL,
		needed_hours DOUBLE NOT NULL,
		is_governing BOOLEAN NOT NULL,
		is_current BOOLEAN NOT NULL,
		made_at DATETIME(3) NOT NULL,
		KEY assessments_current (shipment_id, is_current),
		FOREIGN KEY (shipment_id) REFERENCES shipments (id),
		FOREIGN KEY (line_id) REFERENCES shipment_lines (id),
		FOREIGN KEY (trace_id) REFERENCES traces (id),
		FOREIGN KEY (spec_version_id) REFERENCES spec_versions (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
