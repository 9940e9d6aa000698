/**
 * `npm run reassess -- --check`: recomputes every stored assessment from what it names. Ends with 1 where a digit of
 * the present engine version differs, or an assessment of it cannot be recomputed; tells how older versions differ.
 */
import { availableParallelism } from 'node:os';
import { checkAllAssessments, type CheckReport } from '../lib/server/assessments/check-all';
import { env } from '../lib/server/env';

const mostShown = 20;
const mostFigures = 5;

function lines({ versions, readings }: CheckReport): string[] {
	const total = versions.reduce((sum, { assessments }) => sum + assessments, 0);
	return [
		`${total} assessments, ${readings.toLocaleString('en')} readings recomputed`,
		...versions.flatMap(({ engineVersion, isPresent, assessments, differing, largestRelative }) => [
			`engine ${engineVersion}${isPresent ? ' (present)' : ''}: ${assessments} assessments, ` +
				`${differing.length} differ${differing.length > 0 ? `, by ${largestRelative.toExponential(1)} at most` : ''}`,
			...differing
				.slice(0, mostShown)
				.flatMap(({ id, fault, differences }) => [
					`  ${id}: ${fault ?? `${differences.length} figures differ`}`,
					...differences
						.slice(0, mostFigures)
						.map((one) => `    ${one.path}: stored ${String(one.stored)}, now ${String(one.recomputed)}`)
				])
		])
	];
}

if (!process.argv.includes('--check')) {
	console.error('Say what to do: npm run reassess -- --check');
	process.exitCode = 2;
} else {
	const report = await checkAllAssessments(env().databaseUrl, availableParallelism() - 1);
	for (const line of lines(report)) console.log(line);
	process.exitCode = report.isSound ? 0 : 1;
}
