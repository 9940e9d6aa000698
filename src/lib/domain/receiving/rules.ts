import {
	calibrationReasons,
	caseReasons,
	disagreementReasons,
	pulpAgainstTraceReasons,
	pulpLimitReasons,
	sealReasons
} from './door-reasons';
import type { Evidence } from './evidence';
import type { Reason } from './recommendation';
import {
	earlyStopReasons,
	excursionReasons,
	lifeReasons,
	mktReasons,
	modelReasons,
	openingReasons,
	stopReason,
	unobservedReasons
} from './trace-reasons';

/** A rule looks at the evidence and says what it found: nothing, one thing or several. */
export interface Rule {
	readonly name: string;
	readonly find: (evidence: Evidence) => readonly Reason[];
}

/**
 * The rules, in the order their reasons are shown within one grade.
 *
 * | finding | grade |
 * | --- | --- |
 * | low meets the need | inform |
 * | value meets it, low does not; or high alone does | hold |
 * | not even the high meets it | reject |
 * | no trace | note: never a hold by itself |
 * | stop reached / in doubt | reject / hold |
 * | excursion minor / major / critical | inform / note / hold; in doubt never more than note |
 * | unobserved up to a quarter of the window / more | note / hold |
 * | logger stopped up to 4 h early / more | note / hold |
 * | mean kinetic temperature over its limit | hold |
 * | time outside the model, opening undeclared, calibration overdue, pulp against trace, cases | note |
 * | loggers disagree, seal broken, pulp beyond the limit | hold |
 */
export const rules: readonly Rule[] = [
	{ name: 'life', find: lifeReasons },
	{
		name: 'stops',
		find: (evidence) => (evidence.assessment?.stops ?? []).map((hit) => stopReason(hit, evidence))
	},
	{ name: 'excursions', find: ({ assessment }) => (assessment === null ? [] : excursionReasons(assessment)) },
	{ name: 'pulp limit', find: pulpLimitReasons },
	{ name: 'seal', find: sealReasons },
	{ name: 'disagreement', find: disagreementReasons },
	{ name: 'mean kinetic temperature', find: mktReasons },
	{ name: 'early stop', find: earlyStopReasons },
	{ name: 'unobserved', find: unobservedReasons },
	{ name: 'outside the model', find: modelReasons },
	{ name: 'opening', find: openingReasons },
	{ name: 'pulp against trace', find: pulpAgainstTraceReasons },
	{ name: 'cases', find: caseReasons },
	{ name: 'calibration', find: calibrationReasons }
];
