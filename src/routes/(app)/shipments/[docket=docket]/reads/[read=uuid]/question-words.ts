import type { Answers, Choice, Question, ReadContext } from '$lib/domain/ingest/ingestion';
import type { TemperatureUnit } from '$lib/domain/units';
import { duration, temperature, temperatureSign } from '$lib/format';
import { calendarDay, isoDay, time, timeWithSeconds, zoneName } from '$lib/format-time';
import { evidenceText } from '$lib/messages/en/ingest';
import { choiceLabel } from '$lib/messages/en/ingest-questions';

/** What a choice is called on its card. */
export function answerLabel(question: Question, choice: Choice): string {
	return choiceLabel(question, choice);
}

/** What speaks for it, and the file's own first and last rows as it would read them. */
export function answerNote(choice: Choice, zone: string, unit: TemperatureUnit): string {
	const { firstMs, lastMs, firstCelsius, lastCelsius } = choice;
	const first = rowWords(firstMs, firstCelsius, zone, unit);
	const last = rowWords(lastMs, lastCelsius, zone, unit);
	const rows = first === '' ? '' : `First row ${first}; last row ${last}`;
	return [evidenceText(choice), rows].filter(Boolean).join('. ');
}

/** A row as a choice would read it: `Fri 3 Apr 2026 02:40 CEST, 1.4 °C`. */
function rowWords(ms: number | null, celsius: number | null, zone: string, unit: TemperatureUnit): string {
	const at =
		ms === null ? '' : `${calendarDay(isoDay(ms, zone), 'en')} ${timeWords(ms, zone)} ${zoneName(ms, zone)}`;
	const degrees = celsius === null ? '' : `${temperature(celsius, unit, 'en')} ${temperatureSign(unit)}`;
	return [at, degrees].filter(Boolean).join(', ');
}

/** Seconds only where a row has them. */
function timeWords(ms: number, zone: string): string {
	return ms % 60_000 === 0 ? time(ms, zone) : timeWithSeconds(ms, zone);
}

/** Answers that hold for other files too: a start, an interval or a section is one file's own. */
export function lastingOf({ dateOrder, unit, zone, temperatureColumn }: Answers): Answers {
	return { dateOrder, unit, zone, temperatureColumn };
}

/** The one button: "Use the 3rd of April". */
export function useWords(question: Question, choice: Choice | undefined): string {
	if (!choice) return 'Use this answer';
	const label = choiceLabel(question, choice);
	const isSentence = /^(The|Every|When|So|All) /.test(label);
	return `Use ${isSentence ? label.charAt(0).toLowerCase() + label.slice(1) : label}`;
}

const orders: Readonly<Record<string, string>> = { dmy: 'Day first', mdy: 'Month first', ymd: 'Year first' };

/** What would be remembered; null for answers that belong to one file only. */
export function rememberLabel(question: Question, choice: Choice | undefined): string | null {
	if (['interval', 'start', 'part'].includes(question.code)) return null;
	const what = choice?.answer.dateOrder
		? orders[choice.answer.dateOrder]
		: choice
			? choiceLabel(question, choice)
			: 'The same answer';
	return `${what} for files like this from now on`;
}

interface Span {
	firstMs: number;
	lastMs: number;
	context: ReadContext;
}

/** A file that has nothing to do with this journey is likely another load's; null where it has. */
export function outsideJourney({ firstMs, lastMs, context }: Span): string | null {
	const { journeyFromMs: from, journeyToMs: to } = context;
	if (from !== null && lastMs < from)
		return `All readings lie before this journey: the last is ${duration(from - lastMs)} before loading. Look whether this is another load’s file.`;
	if (to !== null && firstMs > to)
		return `All readings lie after this journey: the first is ${duration(firstMs - to)} after it ended. Look whether this is another load’s file.`;
	return null;
}
