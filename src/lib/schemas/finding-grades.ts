import { z } from 'zod';
import { settableGrades, type FindingGrades } from '../domain/receiving/recommendation';
import { settableFindings } from '../domain/receiving/settable-findings';

const grade = z
	.enum(['', ...settableGrades], { error: 'Choose inform, note or hold, or leave it as usual.' })
	.default('');

/** One choice a finding; an empty one leaves it its usual grade. Findings that cannot be graded are refused. */
export const gradesField = z
	.strictObject(Object.fromEntries(settableFindings.map(({ code }) => [code, grade])), {
		error: 'Life and stops keep their grades. Choose only among the findings shown.'
	})
	.default({})
	.transform((sent): FindingGrades => {
		const chosen = Object.entries(sent).filter(([, one]) => one !== '');
		return Object.fromEntries(chosen) as FindingGrades;
	});
