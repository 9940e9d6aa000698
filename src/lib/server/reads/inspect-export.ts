import type { Answers, Channel, Decision, Ingestion, Oddity, Question } from '../../domain/ingest/ingestion';
import { readExport } from '../../domain/ingest/read-export';
import { isTemperatureUnit } from '../../domain/units';
import { oddityText, questionText, refusalText } from '../../messages/en/ingest';
import { choiceLabel, choiceReading } from '../../messages/en/ingest-questions';
import {
	unitCodes,
	type InspectAnswer,
	type InspectChannel,
	type InspectChoice
} from '../../schemas/inspect';
import { answerFaults } from './answer-faults';
import { answerValue, questionFields } from './inspect-answers';
import { inspectRefusal } from './inspect-refusals';

/** What an inspection is given beside the bytes. */
export interface InspectOrder {
	bytes: Uint8Array;
	answers: Answers;
	/** Zone of the caller's site, assumed for local times that name none, with a warning; UTC without a site. */
	siteZone: string | null;
	/** The moment of the call, UTC ms: no reading can be later. */
	nowMs: number;
}

const zoneWithoutSite = 'UTC';

const nothing: InspectAnswer = {
	outcome: 'ok',
	questions: [],
	refusal: null,
	warnings: [],
	decisions: [],
	channels: []
};

/** What was found, and what is wrong with the answers that were given: field → sentence. */
export interface Inspection {
	answer: InspectAnswer;
	faults: Record<string, string>;
}

/** Reads an export and tells what was found, as other programs are told; nothing is kept. */
export function inspect({ bytes, answers, siteZone, nowMs }: InspectOrder): Inspection {
	const read = (given: Answers): Ingestion =>
		readExport(bytes, {
			uploadedMs: nowMs,
			siteZone: siteZone ?? zoneWithoutSite,
			journeyFromMs: null,
			journeyToMs: null,
			answers: given
		});
	const ingestion = read(answers);
	return { answer: answerOf(ingestion), faults: answerFaults(answers, ingestion, read) };
}

/** The same without a word about the answers. */
export function inspectExport(order: InspectOrder): InspectAnswer {
	return inspect(order).answer;
}

function answerOf(ingestion: Ingestion): InspectAnswer {
	if (ingestion.kind === 'refused') return refusedAnswer(ingestion);
	if (ingestion.kind === 'question')
		return { ...nothing, outcome: 'question', questions: [questionOf(ingestion.question)] };
	const { oddities, decisions, channels } = ingestion.understanding;
	return {
		...nothing,
		outcome: 'ok',
		warnings: oddities.map(warningOf),
		decisions: decisions.map(decisionOf),
		channels: channels.map(channelOf)
	};
}

/** The answer to a file that cannot be read, also where only its size is known. */
export function refusedAnswer({
	code,
	line,
	found
}: Omit<Extract<Ingestion, { kind: 'refused' }>, 'kind'>): InspectAnswer {
	const message = refusalText(code, { line, found });
	return { ...nothing, outcome: 'refused', refusal: { code: inspectRefusal(code), message, line } };
}

function questionOf(question: Question): InspectAnswer['questions'][number] {
	const { title, why } = questionText(question);
	const field = questionFields[question.code];
	return {
		field,
		prompt: [title, why].filter(Boolean).join(' '),
		choices: question.choices.map((choice): InspectChoice => ({
			value: answerValue(field, choice.answer) ?? choice.label,
			label: choiceLabel(question, choice),
			first: choiceReading(choice.firstMs, choice.firstCelsius),
			last: choiceReading(choice.lastMs, choice.lastCelsius)
		}))
	};
}

function warningOf(oddity: Oddity): InspectAnswer['warnings'][number] {
	const { code, count, lines } = oddity;
	return { code, message: oddityText(oddity), count, lines: [...lines] };
}

function decisionOf({ field, value, because }: Decision): InspectAnswer['decisions'][number] {
	if (field === 'dateOrder') return { field, value: value.toUpperCase(), because };
	return { field, value: field === 'unit' && isTemperatureUnit(value) ? unitCodes[value] : value, because };
}

const iso = (ms: number | null): string | null => (ms === null ? null : new Date(ms).toISOString());

function channelOf(channel: Channel): InspectChannel {
	const { unit, isPrimary, firstMs, lastMs, usualIntervalMs, longSteps } = channel;
	const { name, quantity, readings, missing, minCelsius, maxCelsius, meanCelsius } = channel;
	const steps: InspectChannel['longSteps'] = [];
	for (let at = 0; at + 1 < longSteps.length; at += 2)
		steps.push([iso(longSteps[at] ?? 0) ?? '', iso(longSteps[at + 1] ?? 0) ?? '']);
	return {
		name,
		quantity,
		unit: isTemperatureUnit(unit) ? unitCodes[unit] : unit,
		primary: isPrimary,
		readings,
		missing,
		firstAt: iso(firstMs),
		lastAt: iso(lastMs),
		minCelsius,
		maxCelsius,
		meanCelsius,
		intervalSeconds: usualIntervalMs === null ? null : usualIntervalMs / 1000,
		longSteps: steps
	};
}
