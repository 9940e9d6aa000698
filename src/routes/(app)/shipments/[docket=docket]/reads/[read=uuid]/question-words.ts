import type { Choice, Question } from '$lib/domain/ingest/ingestion';
import { dayTime, zoneName } from '$lib/format-time';
import { evidenceText } from '$lib/messages/en/ingest';
import { choiceLabel } from '$lib/messages/en/ingest-questions';

/** What a choice is called on its card. */
export function answerLabel(question: Question, choice: Choice): string {
	return choiceLabel(question, choice);
}

/** What speaks for it, and the journey it would make of the file. */
export function answerNote(choice: Choice, zone: string): string {
	const { firstMs, lastMs } = choice;
	const span =
		firstMs === null || lastMs === null
			? ''
			: `${dayTime(firstMs, zone, 'en')} to ${dayTime(lastMs, zone, 'en')} ${zoneName(lastMs, zone)}`;
	return [evidenceText(choice), span].filter(Boolean).join('. ');
}

/** The one button: "Use the 3rd of April". */
export function useWords(question: Question, choice: Choice | undefined): string {
	if (!choice) return 'Use this answer';
	const label = choiceLabel(question, choice);
	const isSentence = /^(The|Every|When) /.test(label);
	return `Use ${isSentence ? label.charAt(0).toLowerCase() + label.slice(1) : label}`;
}

const orders: Readonly<Record<string, string>> = { dmy: 'Day first', mdy: 'Month first', ymd: 'Year first' };

/** What would be remembered; null for answers that belong to one file only. */
export function rememberLabel(question: Question, choice: Choice | undefined): string | null {
	if (question.code === 'interval' || question.code === 'start') return null;
	const what = choice?.answer.dateOrder
		? orders[choice.answer.dateOrder]
		: choice
			? choiceLabel(question, choice)
			: 'The same answer';
	return `${what} for files like this from now on`;
}
