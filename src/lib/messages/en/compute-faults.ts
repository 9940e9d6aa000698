import type { ComputeFault } from '../../schemas/compute';
import { mostReadings } from '../../schemas/compute-readings';

type Code = Extract<ComputeFault, { code: unknown }>['code'];

/** What is wrong, then what to send: the reader is a program, or its author. */
const sentences: Record<Code, string> = {
	'not-a-time': 'That is no time. Send epoch seconds, or a date and time such as 2026-04-03T06:30:00Z.',
	'no-offset': 'The time does not say its offset from UTC. End it with Z or an offset such as +02:00.',
	'no-such-time': 'There is no such time. Look at the day, the hour and the offset.',
	'leap-second': 'A sixtieth second cannot be counted. Send the second before or after it.',
	milliseconds: 'That looks like milliseconds. Send seconds since 1970.',
	'too-far': 'That is outside the years 0 to 9999. Send seconds since 1970, or a date and time.',
	'not-a-list': 'Send a list of pairs: [[time, celsius], …].',
	'no-readings': 'There is no reading. Send one or more.',
	'too-many-readings': `There are more than ${mostReadings} readings. Send a shorter period.`,
	'not-a-pair': 'Send a pair: [time, celsius].',
	'not-a-number': 'Send a number of °C.',
	'below-absolute-zero': 'No temperature is that cold. Send °C, above absolute zero.',
	'points-unsorted': 'That temperature stands there twice. Send each once.',
	'life-longer-when-warmer': 'Life is longer here than at a colder temperature. Look at both figures.',
	'reference-outside-model': 'It lies below the lowest band. Send a band that begins there or colder.',
	'beyond-numbers':
		'It runs so fast at these temperatures that no number holds the life used. Look at its figures.',
	'reference-not-above-minimum': 'It is not below the reference temperature. Send a colder one.'
};

/** The first sentence for each faulty field. */
export function computeIssues(faults: readonly ComputeFault[]): Record<string, string> {
	const issues: Record<string, string> = {};
	for (const fault of faults)
		issues[fault.field] ??= 'sentence' in fault ? fault.sentence : sentences[fault.code];
	return issues;
}
