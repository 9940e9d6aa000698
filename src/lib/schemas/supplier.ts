import { z } from 'zod';
import type { Range } from '../domain/receiving/assessment';
import type { RangePart } from '../domain/receiving/range-parts';
import type { Outcome } from '../domain/receiving/recommendation';
import type { TemperatureUnit } from '../domain/units';
import type { AssessmentView, LineOutcomeView, SeriesView, Verdict } from './docket';

/** What a supplier is told of one of its lines. */
export interface SupplierLineView {
	ordinal: number;
	product: string;
	lot: string;
	cases: number;
	remainingHours: Range | null;
	neededHours: number;
	fullLifeHours: number;
	outcome: Outcome | null;
	condition: string | null;
	reason: string | null;
	/** Of a line that was split: each group with its counts; the place inside the receiver’s house is not the supplier’s. */
	groups?: LineOutcomeView[];
	/** What was signed, in words. */
	details?: string;
	/** What low to high is made of; records of older engines lack it. */
	rangeParts?: RangePart[];
}

/** An excursion as readings: no other holder is named, only whether it fell while the supplier held the goods. */
export interface SupplierExcursionView {
	name: string;
	kind: 'too-warm' | 'too-cold';
	severity: 'minor' | 'major' | 'critical';
	fromAt: string;
	toAt: string;
	minutes: number;
	extremeCelsius: number;
	limitCelsius: number;
	costHours: number;
	isInOwnHands: boolean;
}

export interface NoticeView {
	id: string;
	number: string;
	answerByAt: string | null;
	answers: {
		kind: 'acknowledge' | 'dispute';
		disputed: string[];
		whatIsWrong: string;
		whatWillBeDone: string;
		who: string;
		doneByOn: string | null;
		at: string;
		by: string;
	}[];
}

/** A docket as its supplier sees it: signed facts about its own load, and nothing of anybody else. */
export interface SupplierDocketView {
	id: string;
	number: string;
	title: string;
	purchaseOrder: string | null;
	siteName: string;
	zone: string;
	temperatureUnit: TemperatureUnit;
	referenceCelsius: number;
	arrivedAt: string;
	verdict: Verdict;
	version: number;
	signedAt: string;
	lines: SupplierLineView[];
	logger: { label: string; placement: 'air' | 'between-cases' | 'in-product' } | null;
	excursions: SupplierExcursionView[];
	/** For the chart: the deciding assessment, its legs without anybody's name but the supplier's. */
	assessment: AssessmentView | null;
	series: SeriesView[];
	/** When the goods left the supplier's hands. */
	handedOverAt: string | null;
	openingHours: number | null;
	openingKind: 'declared' | 'computed' | 'undeclared';
	report: { id: string; fileName: string; bytes: number } | null;
	reads: { id: string; label: string; fileName: string; bytes: number }[];
	photos: { id: string; caption: string; bytes: number }[];
	notice: NoticeView | null;
}

const text = (longest: number) =>
	z.string().trim().max(longest, `At most ${longest} characters.`).default('');

/** What a supplier answers to a notice. */
export const answerSchema = z
	.object({
		kind: z.enum(['acknowledge', 'dispute'], 'Say whether you acknowledge the facts or dispute them.'),
		disputed: z
			.union([z.string().transform((one) => [one]), z.array(z.string())])
			.optional()
			.transform((list) => (list ?? []).map((one) => one.slice(0, 40)).slice(0, 40)),
		whatIsWrong: text(4000),
		whatWillBeDone: text(4000),
		who: z.string().trim().min(1, 'Say who answers.').max(120, 'At most 120 characters.'),
		doneByOn: z
			.string()
			.optional()
			.transform((day) => day || null)
			.refine((day) => day === null || /^\d{4}-\d{2}-\d{2}$/.test(day), 'Write the day as YYYY-MM-DD.')
	})
	.superRefine((answer, ctx) => {
		if (answer.kind === 'dispute' && !answer.whatIsWrong)
			ctx.addIssue({
				code: 'custom',
				path: ['whatIsWrong'],
				message: 'Say what is wrong, and what shows it.'
			});
	});

export type AnswerInput = z.output<typeof answerSchema>;
