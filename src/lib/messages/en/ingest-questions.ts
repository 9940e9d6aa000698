import type { Choice, Question, QuestionCode } from '../../domain/ingest/ingestion';

const months = [
	'January',
	'February',
	'March',
	'April',
	'May',
	'June',
	'July',
	'August',
	'September',
	'October',
	'November',
	'December'
];

/** `1st`, `2nd`, `3rd`, `4th`; eleven to thirteen are `th`. */
export function ordinal(day: number): string {
	const tens = day % 100;
	if (tens >= 11 && tens <= 13) return `${day}th`;
	return `${day}${{ 1: 'st', 2: 'nd', 3: 'rd' }[day % 10] ?? 'th'}`;
}

/** The day that two numbers of a date are in one order: `the 3rd of April`. */
export function dayInWords(subject: string, order: string): string {
	const [first = 0, second = 0] = (subject.match(/\d+/g) ?? []).map(Number);
	if (order === 'ymd') return `${months[second - 1] ?? second} ${first < 100 ? 2000 + first : first}`;
	const [day, month] = order === 'mdy' ? [second, first] : [first, second];
	return `the ${ordinal(day)} of ${months[month - 1] ?? month}`;
}

function listed(parts: readonly string[]): string {
	return parts.length < 2 ? (parts[0] ?? '') : `${parts.slice(0, -1).join(', ')} or ${parts.at(-1)}`;
}

const titles: Readonly<Record<QuestionCode, (question: Question) => string>> = {
	'date-order': ({ subject, choices }) =>
		`Is ${subject} ${listed(choices.map(({ label }) => dayInWords(subject, label)))}?`,
	unit: ({ subject, choices }) =>
		`Is ${subject} in ${listed(choices.map(({ label }) => unitWords[label] ?? label))}?`,
	zone: () => 'Which time zone are the times in?',
	'temperature-column': () => 'Which column is the temperature of the goods?',
	interval: () => 'How far apart are the readings?',
	start: () => 'When did the logger start?',
	part: ({ why }) =>
		why === 'clock-restarts'
			? 'The clock starts anew inside the file. Which readings count?'
			: 'Which of the recordings in the file is this load’s?'
};

const unitWords: Readonly<Record<string, string>> = { celsius: '°C', fahrenheit: '°F', kelvin: 'K' };

const whys: Readonly<Record<string, string>> = {
	'all-one-day': 'Every row is on one day, so the file cannot tell.',
	'all-days-up-to-12': 'No day is over 12 and both readings run on, so the file cannot tell.',
	'no-unit': 'The file names no unit, so the figures alone would have to tell.',
	'no-zone': 'The file gives local times without saying where.',
	'unknown-zone': 'The file names a time zone that is not known.',
	'several-zones': 'The file names more than one time zone.',
	daylight: 'What the file says of summer time leaves an hour open.',
	'two-languages': 'The month’s name is another month’s in another language.',
	'several-temperatures': 'The file has several temperatures and does not say which rode with the goods.',
	'several-parts': 'The file holds several recordings, one after the other.',
	'clock-restarts': 'The times fall back and run on from there, so the file cannot tell.',
	'no-times': 'The rows carry no time of their own.',
	'two-calendars': 'The days may be counted from 1900 or from 1904, four years apart.',
	'clock-never-set': 'The times begin where a clock does that was never set.',
	'relative-times': 'The file counts its times back from a moment it does not name.'
};

/** The question itself, used as the title of its page. */
export function questionTitle(question: Question): string {
	return titles[question.code](question);
}

/** Why the file cannot tell. */
export function questionWhy({ why }: Question): string {
	return whys[why] ?? '';
}

const partWords: Readonly<Record<string, string>> = {
	before: 'The readings before the clock starts anew',
	joined: 'All readings, one after the other'
};

function partLabel(label: string, part: string): string {
	const words = partWords[part] ?? `The ${part} recording`;
	return label === '' || label === part ? words : `${words}: ${label}`;
}

const startWords: Readonly<Record<string, string>> = {
	journey: 'When the load was loaded',
	arrival: 'So that it ends at the arrival',
	upload: 'So that it ends at the upload',
	'as-written': 'As the file says',
	'days-of-1904': 'Days counted from 1904',
	croatian: 'Months by their Croatian names',
	'polish-czech': 'Months by their Polish or Czech names',
	'declared-end': 'So that it ends when the file says',
	'declared-day': 'At the start of the day the file names'
};

function intervalWords(seconds: number): string {
	if (seconds % 3600 === 0) return `${seconds / 3600} h`;
	return seconds % 60 === 0 ? `${seconds / 60} min` : `${seconds} s`;
}

/** What one choice is called: the day in words, the unit, the column, the interval. */
export function choiceLabel({ code, subject }: Question, { label, answer }: Choice): string {
	if (code === 'date-order') {
		const words = dayInWords(subject, label);
		return words.charAt(0).toUpperCase() + words.slice(1);
	}
	if (code === 'unit') return unitWords[label] ?? label;
	if (code === 'part') return partLabel(label, answer.part ?? '');
	if (code === 'interval') return `Every ${intervalWords(answer.intervalSeconds ?? Number(label) * 60)}`;
	if (code !== 'start') return label;
	return startWords[label] ?? label;
}

/** A reading as a choice would have it: `2026-04-03 06:10:00 UTC, 4.5 °C`; null where neither is known. */
export function choiceReading(ms: number | null, celsius: number | null): string | null {
	const at = ms === null ? null : `${new Date(ms).toISOString().slice(0, 19).replace('T', ' ')} UTC`;
	const value = celsius === null ? null : `${Math.round(celsius * 100) / 100} °C`;
	return [at, value].filter((part) => part !== null).join(', ') || null;
}
