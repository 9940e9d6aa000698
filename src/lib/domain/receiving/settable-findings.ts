import type { Grade, ReasonCode, SettableGrade } from './recommendation';

/** A finding that product and lane may grade otherwise, with its grade unless they do; null: it depends on how far. */
export interface SettableFinding {
	readonly code: ReasonCode;
	readonly usualGrade: Extract<Grade, SettableGrade> | null;
}

/** Every finding of the settable rules, in the order of the rules. Life needed at the dock and stops are not among them. */
export const settableFindings = [
	{ code: 'customer-life-short', usualGrade: 'hold' },
	{ code: 'excursion', usualGrade: null },
	{ code: 'evidence-incomplete', usualGrade: 'hold' },
	{ code: 'date-passed', usualGrade: 'hold' },
	{ code: 'date-short', usualGrade: 'hold' },
	{ code: 'date-missing', usualGrade: 'note' },
	{ code: 'older-than-last', usualGrade: 'hold' },
	{ code: 'pulp-above-limit', usualGrade: 'hold' },
	{ code: 'seal-broken', usualGrade: 'hold' },
	{ code: 'loggers-disagree', usualGrade: 'hold' },
	{ code: 'mkt-over-limit', usualGrade: 'hold' },
	{ code: 'logger-stopped-early', usualGrade: null },
	{ code: 'logger-started-late', usualGrade: 'note' },
	{ code: 'unobserved', usualGrade: null },
	{ code: 'logger-missing', usualGrade: 'note' },
	{ code: 'transit-late', usualGrade: 'note' },
	{ code: 'unit-set-point-differs', usualGrade: 'note' },
	{ code: 'unit-return-air-warm', usualGrade: 'note' },
	{ code: 'outside-model', usualGrade: 'note' },
	{ code: 'opening-undeclared', usualGrade: 'note' },
	{ code: 'pulp-against-air', usualGrade: 'note' },
	{ code: 'cases-differ', usualGrade: 'note' },
	{ code: 'calibration-overdue', usualGrade: 'note' },
	{ code: 'interval-too-long', usualGrade: 'note' }
] as const satisfies readonly SettableFinding[];

export type SettableCode = (typeof settableFindings)[number]['code'];
