import { Op } from 'sequelize';
import type { Answers, Choice, Question } from '../../domain/ingest/ingestion';
import type { StoredIngestion } from '../../schemas/read';
import { RememberedLayout } from '../db/models/remembered-layout';
import { parseAnswers } from './answers';
import { fingerprintColumn } from './fingerprint';

/** A file is asked about no more often than this. */
const mostQuestions = 6;

type Reading = (answers: Answers) => Promise<{ summary: StoredIngestion }>;

/** A file read by what was answered for its like, and which layout said so. */
export interface AppliedLayout {
	summary: StoredIngestion;
	layoutId: string;
}

/**
 * Answers a file's questions as they were answered for files of its layout from this sender, or from anybody; null
 * where nothing is remembered. Only a choice that is offered for this very file is taken, and none that the evidence
 * speaks against: then the question stands.
 */
export async function applyRemembered(
	summary: StoredIngestion,
	partnerId: string,
	readWith: Reading
): Promise<AppliedLayout | null> {
	if (summary.kind !== 'question') return null;
	const forSender = { [Op.or]: [{ partnerId }, { partnerId: null }], withdrawnAt: null };
	if ((await RememberedLayout.count({ where: forSender })) === 0) return null;
	const fingerprint = await fingerprintBehind(summary, readWith);
	if (fingerprint === null) return null;
	const found = await RememberedLayout.findAll({
		where: { ...forSender, fingerprint: fingerprintColumn(fingerprint) },
		order: [['version', 'DESC']]
	});
	const layout = found.find((one) => one.partnerId !== null) ?? found[0];
	if (!layout) return null;
	const settled = await settledBy(parseAnswers(layout.answers), summary, readWith);
	return settled && { summary: settled, layoutId: layout.id };
}

/** The layout shows only in a reading, so first choices are tried, for its fingerprint alone. */
async function fingerprintBehind(summary: StoredIngestion, readWith: Reading): Promise<string | null> {
	let tried = summary;
	let answers: Answers = {};
	for (let asked = 0; asked < mostQuestions && tried.kind === 'question'; asked++) {
		answers = { ...answers, ...tried.question.choices[0]?.answer };
		tried = (await readWith(answers)).summary;
	}
	return tried.kind === 'ok' ? tried.layout.fingerprint : null;
}

async function settledBy(
	remembered: Answers,
	summary: StoredIngestion,
	readWith: Reading
): Promise<StoredIngestion | null> {
	let at = summary;
	let answers: Answers = {};
	for (let asked = 0; asked < mostQuestions && at.kind === 'question'; asked++) {
		const taken = rememberedChoice(at.question, remembered);
		if (taken === null) break;
		answers = { ...answers, ...taken.answer };
		at = (await readWith(answers)).summary;
	}
	return at === summary || at.kind === 'refused' ? null : at;
}

/** The choice that was taken before, where it is offered again and nothing speaks against it. */
export function rememberedChoice(question: Question, remembered: Answers): Choice | null {
	const known = new Map<string, unknown>(Object.entries(remembered));
	const isSame = ({ answer }: Choice) =>
		Object.entries(answer).every(([name, value]) => known.get(name) === value);
	const taken = question.choices.find(isSame);
	if (!taken || speaksAgainst(taken)) return null;
	const fits = ({ evidence }: Choice) => evidence.includes('fits-journey');
	return question.choices.some(fits) && !fits(taken) ? null : taken;
}

function speaksAgainst({ evidence }: Choice): boolean {
	return evidence.includes('after-upload') || evidence.includes('implausible');
}
