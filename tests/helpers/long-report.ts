import type { ReportInput } from '../../src/lib/server/reports/pdf/report-input';
import { samplePhoto } from '../../src/lib/server/photos/sample-photo';
import { sha256Hex } from '../../src/lib/server/storage/sha256';
import { reportInput } from './report-fixture';

const loggers = 12;
const photoId = (n: number) => `photo-${n}`;
const longNote =
	'Row three of the load stood askew and had to be restacked by hand before the lift could take it; the film was torn on both sides. ';

/** Forty lines, twelve loggers, sixty excursions, long notes, photographs: what must still print whole. */
export function longReport(overrides: Partial<ReportInput> = {}): ReportInput {
	const input = reportInput(overrides, 40);
	const { docket } = input.frozen;
	const labels = docket.loggers.slice(0, loggers).map(({ label }) => label);
	const governing = (ordinal: number) => labels[(ordinal - 1) % loggers] ?? '';
	const lines = docket.lines.map((line) => ({
		...line,
		loggers: [governing(line.ordinal)],
		recommendation: { recommended: 'accept' as const, reasons: [] }
	}));
	const assessments = docket.assessments.map((assessment, i) => {
		const lead = assessment.excursions[0] ?? docket.assessments[2]?.excursions[0];
		const excursions = lead
			? Array.from({ length: 5 }, (_, n) => ({
					...lead,
					fromMs: lead.fromMs + n * 7_200_000,
					toMs: lead.toMs + n * 7_200_000
				}))
			: [];
		const label = governing(i + 1);
		return { ...assessment, logger: label, traceId: `trace-${label}`, excursions };
	});
	const reasonTexts = Object.fromEntries(
		lines.map(({ id, ordinal }) => [
			id,
			[`Life suffices on line ${ordinal}: 12.0 d on the low against 11.0 d needed.`]
		])
	);
	const photos = Array.from({ length: 7 }, (_, n) => ({
		id: photoId(n),
		caption: n === 3 ? 'Row three, film torn on both sides, seen from the dock plate' : `Pallet ${n + 1}`,
		kind: 'load',
		by: 'D. Marsh',
		at: '2026-04-03T06:10:00.000Z',
		bytes: samplePhoto.byteLength
	}));
	const notes = Array.from({ length: 9 }, (_, n) => ({
		id: `note-${n}`,
		text: `Note ${n + 1}. ${longNote.repeat(n + 1)}`,
		by: 'Maximiliane Brandstetter-Oyelaran',
		at: '2026-04-03T06:20:00.000Z'
	}));
	const pulp = Array.from({ length: 30 }, (_, n) => ({
		...(docket.pulp[0] ?? {
			lot: null,
			position: 'nose',
			caseLabel: null,
			celsius: 1,
			text: '1',
			instrument: null,
			takenAt: ''
		}),
		id: `pulp-${n}`,
		lineId: lines[n]?.id ?? null,
		celsius: n / 10,
		text: `${(n / 10).toFixed(1)} °C`,
		takenAt: '2026-04-03T05:10:00.000Z'
	}));
	return {
		...input,
		reasonTexts,
		photos: photos.map(({ id }) => ({ id, sha256: sha256Hex(samplePhoto), jpeg: samplePhoto })),
		signature: {
			...input.signature,
			reasons: `${input.signature.reasons} ${longNote.repeat(12)}End of the reasons.`
		},
		frozen: {
			...input.frozen,
			series: input.frozen.series.slice(0, loggers),
			docket: {
				...docket,
				lines,
				assessments,
				loggers: docket.loggers.slice(0, loggers),
				photos,
				notes,
				pulp
			}
		}
	};
}
