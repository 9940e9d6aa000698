import { table } from '../table-migration';

/** Life used against life allowed on one leg. */
export const { up, down } = table({
	name: 'leg_uses',
	columns: `
		id UUID NOT NULL PRIMARY KEY,
		assessment_id UUID NOT NULL,
		handover_id UUID NOT NULL,
		ordinal INT NOT NULL,
		allowed_hours DOUBLE NULL,
		used_hours DOUBLE NOT NULL,
		too_warm_hours DOUBLE NULL,
		too_late_hours DOUBLE NULL,
		KEY leg_uses_assessment (assessment_id),
		FOREIGN KEY (assessment_id) REFERENCES assessments (id),
		FOREIGN KEY (handover_id) REFERENCES handovers (id)
	`,
	grants: ['UPDATE', 'DELETE']
});
