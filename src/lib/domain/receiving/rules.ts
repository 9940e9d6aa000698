import {
	dateReasons,
	incompleteReasons,
	intervalReasons,
	lateStartReasons,
	loggerMissingReasons,
	transitReasons,
	unitReasons
} from './gate-reasons';
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
	customerLifeReasons,
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
	/** Product and lane may grade what it finds otherwise. */
	readonly isSettable: boolean;
	readonly find: (evidence: Evidence) => readonly Reason[];
}

const fixed = (name: string, find: Rule['find']): Rule => ({ name, isSettable: false, find });
const settable = (name: string, find: Rule['find']): Rule => ({ name, isSettable: true, find });

/**
 * The rules, in the order their reasons are shown within one grade. Life and stops are fixed; every other finding
 * may be graded inform, note or hold by product and lane, the lane before the product.
 *
 * | finding | grade unless set |
 * | --- | --- |
 * | low meets the need | inform |
 * | value meets it, low does not; or high alone does | hold |
 * | not even the high meets it | reject |
 * | low falls short of what the customer needs, before any onward trip | hold |
 * | no trace | note: never a hold by itself |
 * | stop reached / in doubt | reject / hold |
 * | excursion minor / major / critical | inform / note / hold; in doubt never more than note |
 * | at the door, and neither trace nor pulp speaks | hold |
 * | printed date passed, too near for the customer, or older than the last received | hold |
 * | printed date missing where the customer asks for one | note |
 * | pulp beyond the limit, seal broken, loggers disagree | hold |
 * | mean kinetic temperature over its limit | hold |
 * | unobserved up to a quarter of the window / more | note / hold |
 * | logger stopped up to 4 h early / more | note / hold |
 * | logger started late, a required one missing | note |
 * | without a trace: the journey took longer than planned | note |
 * | unit's set-point not the agreed one, its return air over the limit | note |
 * | time outside the model, opening undeclared, pulp against trace, cases | note |
 * | calibration overdue, interval longer than EN 12830 has it | note |
 */
export const rules: readonly Rule[] = [
	fixed('life', lifeReasons),
	fixed('stops', (evidence) => (evidence.assessment?.stops ?? []).map((hit) => stopReason(hit, evidence))),
	settable('life at the customer', customerLifeReasons),
	settable('excursions', ({ assessment }) => (assessment === null ? [] : excursionReasons(assessment))),
	settable('evidence incomplete', incompleteReasons),
	settable('printed date', dateReasons),
	settable('pulp limit', pulpLimitReasons),
	settable('seal', sealReasons),
	settable('disagreement', disagreementReasons),
	settable('mean kinetic temperature', mktReasons),
	settable('early stop', earlyStopReasons),
	settable('late start', lateStartReasons),
	settable('unobserved', unobservedReasons),
	settable('logger missing', loggerMissingReasons),
	settable('transit', transitReasons),
	settable('unit', unitReasons),
	settable('outside the model', modelReasons),
	settable('opening', openingReasons),
	settable('pulp against trace', pulpAgainstTraceReasons),
	settable('cases', caseReasons),
	settable('calibration', calibrationReasons),
	settable('interval', intervalReasons)
];
