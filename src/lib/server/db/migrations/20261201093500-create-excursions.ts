import { table } from '../table-migration';

/** A stretch outside a limit found by an assessment. */
export const { up, down } = table({
	name: 'excursions',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		assessment_id UUID NOT NULL,
		ordinal INT NOT NULL,
		kind ENUM ('too-warm', 'too-cold') NOT NULL,
		severity ENUM ('minor', 'major', 'critical') NOT NULL,
		from_at DATETIME(3) NOT NULL,
		to_at DATETIME(3) NOT NULL,
		extreme_celsius DOUBLE NOT NULL,
		cost_hours DOUBLE NOT NULL,
		KEY excursions_assessment (assessment_id),
		FOREIGN KEY (assessment_id) REFERENCES assessments (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
