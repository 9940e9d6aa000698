import type { AssessmentView, DocketLineView, SeriesView } from '../../../schemas/docket';
import { calendar, thermometer, type Calendar, type Thermometer } from './text';
import type { ReportInput } from './report-input';
import { sheetOf, type Sheet } from './sheet';

/** What one logger says under one spec, and the lines it governs. */
export interface Chapter {
	readonly assessment: AssessmentView;
	readonly lines: readonly DocketLineView[];
	readonly series: SeriesView | null;
	/** Other traces of the same lines, drawn quietly behind. */
	readonly others: readonly SeriesView[];
	/** Only the first chapter of a spec has a chart: the others' traces stand behind in it. */
	readonly hasChart: boolean;
}

/** The input with what every part of the report needs from it. */
export interface Draft {
	readonly input: ReportInput;
	readonly docket: ReportInput['frozen']['docket'];
	readonly sheet: Sheet;
	readonly thermometer: Thermometer;
	readonly calendar: Calendar;
	readonly chapters: readonly Chapter[];
	/** The line that stands worst against its need; null where no life is known. */
	readonly leadLine: DocketLineView | null;
}

/** Everything the parts draw from, settled once. */
export function draftOf(input: ReportInput): Draft {
	const { docket } = input.frozen;
	const leadLine = worstLine(docket.lines);
	return {
		input,
		docket,
		sheet: sheetOf(input.pageSize),
		thermometer: thermometer(docket.site.temperatureUnit),
		calendar: calendar(docket.site.zone),
		chapters: chaptersOf(input, leadLine),
		leadLine
	};
}

function worstLine(lines: readonly DocketLineView[]): DocketLineView | null {
	let worst: DocketLineView | null = null;
	let worstMarginHours = Infinity;
	for (const line of lines) {
		if (line.remainingHours === null) continue;
		const marginHours = line.remainingHours.low - line.neededHours;
		if (marginHours < worstMarginHours) [worst, worstMarginHours] = [line, marginHours];
	}
	return worst;
}

function chaptersOf(input: ReportInput, leadLine: DocketLineView | null): Chapter[] {
	const { docket, series } = input.frozen;
	const governing = docket.assessments.filter((assessment) => assessment.isGoverning);
	governing.sort((a, b) => Number(b.lineId === leadLine?.id) - Number(a.lineId === leadLine?.id));
	const groups = new Map<string, AssessmentView[]>();
	for (const assessment of governing) {
		const key = `${assessment.traceId} ${assessment.specId} ${assessment.specVersion} ${assessment.openingHours.value} ${assessment.neededHours}`;
		groups.set(key, [...(groups.get(key) ?? []), assessment]);
	}
	const charted = new Set<string>();
	return [...groups.values()].flatMap((group) => {
		const [assessment] = group;
		if (assessment === undefined) return [];
		const own = series.find((candidate) => candidate.traceId === assessment.traceId) ?? null;
		const spec = `${assessment.specId} ${assessment.specVersion}`;
		const hasChart = own !== null && !charted.has(spec);
		if (hasChart) charted.add(spec);
		const lines = docket.lines.filter((line) => group.some((member) => member.lineId === line.id));
		return [{ assessment, lines, series: own, others: othersOf(input, assessment, own), hasChart }];
	});
}

/** Traces that rode with lines of the same spec. */
function othersOf(input: ReportInput, assessment: AssessmentView, own: SeriesView | null): SeriesView[] {
	const { docket, series } = input.frozen;
	const sameSpec = docket.assessments.filter((other) => other.specId === assessment.specId);
	const traces = new Set(sameSpec.map((other) => other.traceId));
	return series.filter((candidate) => candidate !== own && traces.has(candidate.traceId));
}

/** The legs' letters, as the chart's strip and the tables name them. */
export function legLetter(ordinal: number): string {
	const index = Math.max(ordinal - 1, 0);
	const letter = String.fromCharCode(65 + (index % 26));
	return index < 26 ? letter : `${letter}${Math.floor(index / 26)}`;
}

/** "line 3" or "lines 1, 2". */
export function lineNames(lines: readonly DocketLineView[]): string {
	return `${lines.length === 1 ? 'line' : 'lines'} ${lines.map((line) => line.ordinal).join(', ')}`;
}
