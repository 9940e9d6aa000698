import { fetchReadingLine, fetchSeries, fetchTraceBasis, fetchTraceLines } from '$lib/api';
import type { DrawnSeries } from '$lib/components/chart/chart-model';
import { linesOfRuns } from '$lib/domain/ingest/line-runs';
import type { AssessmentView, DocketLoggerView } from '$lib/schemas/docket';
import type { LineView } from '$lib/schemas/file-lines';
import type { Assessed } from './reading-row';
import { assessWhole, wholeTraceOf, type WholeTrace } from './whole-trace';

/** A logger of the load that has readings. */
export interface ReadLogger extends DocketLoggerView {
	traceId: string;
	/** Its place among the loggers, by which its line is drawn. */
	styleAt: number;
}

/** What the reviewer has before them, as the docket stands. */
interface Reviewed {
	loggers: readonly DocketLoggerView[];
	assessments: readonly AssessmentView[];
	leading: AssessmentView | null;
}

/** More lines than this at once are a tangle: the others are drawn when they are asked for. */
const mostDrawnAtFirst = 6;
const pointsAtRest = 1500;

type View = { fromMs: number; toMs: number } | null;

/** Which loggers are looked at, what was fetched of them, and what it comes to. */
export class TraceReview {
	readonly loggers: readonly ReadLogger[];
	readonly #reviewed: Reviewed;
	primaryId = $state('');
	drawnIds = $state<string[]>([]);
	trouble = $state<string | null>(null);
	#series = $state.raw<Record<string, DrawnSeries>>({});
	#wholes = $state.raw<Record<string, WholeTrace>>({});
	#lines = $state.raw<Record<string, Int32Array>>({});
	#view: View = null;
	#asked = 0;

	constructor(reviewed: Reviewed) {
		this.#reviewed = reviewed;
		this.loggers = reviewed.loggers.flatMap((logger, styleAt) =>
			logger.traceId === null ? [] : [{ ...logger, traceId: logger.traceId, styleAt }]
		);
		const governing = this.loggers.find(({ label }) => label === reviewed.leading?.logger) ?? this.loggers[0];
		this.primaryId = governing?.traceId ?? '';
		const first = [governing, ...this.loggers.filter((logger) => logger !== governing)];
		this.drawnIds = first.slice(0, mostDrawnAtFirst).flatMap((logger) => logger?.traceId ?? []);
	}

	primary = $derived.by(() => this.loggerOf(this.primaryId));

	/** What is drawn, as far as it has come, the primary one marked. */
	series = $derived.by(() =>
		this.loggers.flatMap(({ traceId, label, styleAt }) => {
			const one = this.drawnIds.includes(traceId) ? this.#series[traceId] : undefined;
			return one ? [{ ...one, label, styleAt, isGoverning: traceId === this.primaryId }] : [];
		})
	);

	assessment = $derived.by(() => this.assessmentOf(this.primaryId));

	loggerOf(traceId: string): ReadLogger | undefined {
		return this.loggers.find((logger) => logger.traceId === traceId);
	}

	/** Of the line the docket speaks of, where this logger rode with it; otherwise of the one with the least life. */
	assessmentOf(traceId: string): AssessmentView | null {
		const { assessments, leading } = this.#reviewed;
		const own = assessments.filter((assessment) => assessment.traceId === traceId);
		return own.find(({ lineId }) => lineId === leading?.lineId) ?? own[0] ?? null;
	}

	wholeOf(traceId: string): WholeTrace | null {
		return this.#wholes[traceId] ?? null;
	}

	linesOf(traceId: string): Int32Array | null {
		return this.#lines[traceId] ?? null;
	}

	/** The same assessment worked out here, reading by reading; null where the docket shows an older one. */
	assessedOf(traceId: string): Assessed | null {
		const whole = this.wholeOf(traceId);
		const basis = whole?.assessed.find(({ assessmentId }) => assessmentId === this.assessmentOf(traceId)?.id);
		const assessment = whole && basis ? assessWhole(whole, basis) : null;
		return basis && assessment && typeof assessment !== 'string' ? { assessment, basis } : null;
	}

	draw(traceId: string, isDrawn: boolean): Promise<void> {
		const others = this.drawnIds.filter((id) => id !== traceId);
		this.drawnIds = isDrawn ? [...others, traceId] : others;
		return this.show(this.#view);
	}

	choose(traceId: string): Promise<void> {
		this.primaryId = traceId;
		return this.draw(traceId, true);
	}

	/** Fetches what is drawn at a view, and of each logger the whole where that has not come yet. */
	async show(view: View): Promise<void> {
		this.#view = view;
		const mine = ++this.#asked;
		await this.#trying(async () => {
			const fetched = await Promise.all(this.drawnIds.map((id) => fetchSeries(id, view, pointsAtRest)));
			// A slower answer to an earlier zoom must not replace a later one.
			if (mine === this.#asked) this.#series = Object.fromEntries(fetched.map((one) => [one.traceId, one]));
			await Promise.all(this.drawnIds.map((id) => this.loadWhole(id)));
		});
	}

	async loadWhole(traceId: string): Promise<void> {
		if (traceId in this.#wholes) return;
		const whole = wholeTraceOf(await fetchTraceBasis(traceId));
		this.#wholes = { ...this.#wholes, [traceId]: whole };
	}

	/** For the table: every reading, and where each stands in its file. */
	async loadTable(traceId: string): Promise<void> {
		await this.#trying(async () => {
			await this.loadWhole(traceId);
			if (traceId in this.#lines) return;
			const { runs } = await fetchTraceLines(traceId);
			this.#lines = { ...this.#lines, [traceId]: linesOfRuns(runs) };
		});
	}

	askLine = (traceId: string, atMs: number): Promise<LineView> => fetchReadingLine(traceId, atMs);

	async #trying(work: () => Promise<void>): Promise<void> {
		try {
			await work();
			this.trouble = null;
		} catch (error) {
			this.trouble = error instanceof Error ? error.message : 'Try again.';
		}
	}
}
