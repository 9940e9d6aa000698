import type { Choice, Question, ReadContext } from '$lib/domain/ingest/ingestion';
import { duration } from '$lib/format';
import { dayTime, isoDay, time, zoneName } from '$lib/format-time';
import { evidenceText } from '$lib/messages/en/ingest';
import { choiceLabel } from '$lib/messages/en/ingest-questions';

/** What a choice is called on its card. */
export function answerLabel(question: Question, choice: Choice): string {
	return choiceLabel(question, choice);
}

/** What speaks for it, and the journey it would make of the file. */
export function answerNote(choice: Choice, zone: string): string {
	const { firstMs, lastMs } = choice;
	const span = firstMs === null || lastMs === null ? '' : spanWords(firstMs, lastMs, zone);
	return [evidenceText(choice), span].filter(Boolean).join('. ');
}

/** From the first reading to the last; the day once where it is one day. */
export function spanWords(firstMs: number, lastMs: number, zone: string): string {
	const isOneDay = isoDay(firstMs, zone) === isoDay(lastMs, zone);
	const last = isOneDay ? time(lastMs, zone) : dayTime(lastMs, zone, 'en');
	return `${dayTime(firstMs, zone, 'en')} to ${last} ${zoneName(lastMs, zone)}`;
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
