import type { SettableCode } from '../../domain/receiving/settable-findings';

/** What a finding is about, as the heading of its grade. */
export const findingNames: Readonly<Record<SettableCode, string>> = {
	'customer-life-short': 'Less life left than the customer needs',
	excursion: 'Excursion beyond a limit',
	'evidence-incomplete': 'At the door, neither trace nor pulp reading',
	'date-passed': 'Printed date has passed',
	'date-short': 'Printed date nearer than the customer takes',
	'date-missing': 'Printed date asked for and not given',
	'older-than-last': 'Printed date older than the last received',
	'pulp-above-limit': 'Pulp warmer than the upper limit',
	'seal-broken': 'Seal not intact',
	'loggers-disagree': 'Loggers differ beyond their accuracies',
	'mkt-over-limit': 'Mean kinetic temperature over its limit',
	'logger-stopped-early': 'Readings end before the journey',
	'logger-started-late': 'Readings begin after the journey did',
	unobserved: 'Gaps in the readings',
	'logger-missing': 'A required logger was not read',
	'transit-late': 'Without a trace, longer on the way than planned',
	'unit-set-point-differs': 'Unit not set to what was agreed',
	'unit-return-air-warm': 'Return air over the upper limit',
	'outside-model': 'Time outside the model’s range',
	'opening-undeclared': 'Opening balance not declared',
	'pulp-against-air': 'Pulp and air far apart',
	'cases-differ': 'Cases received differ from advised',
	'calibration-overdue': 'Calibration overdue',
	'interval-too-long': 'Recording interval longer than EN 12830 has it'
};

/** How much a finding counts for. */
export const gradeWords = {
	inform: 'inform: said, nothing more',
	note: 'note: stands with the reasons',
	hold: 'hold: QA decides'
} as const;
