import { createHash } from 'node:crypto';
import type {
	AssessmentView,
	DocketLineView,
	DocketLoggerView,
	FrozenDocket,
	SeriesView
} from '../../src/lib/schemas/docket';
import type { ReportInput } from '../../src/lib/server/reports/pdf/report-input';
import { excursionsOfJourney, legsOfJourney } from './report-journey';

/** An invented journey of blueberries over four days: a warm cross-dock, a cold night, a gap. No figure is a check value. */
const fromMs = Date.parse('2026-03-30T06:10:00Z');
const toMs = Date.parse('2026-04-03T05:10:00Z');
const stepMs = 600_000;

const sha = (text: string) => createHash('sha256').update(text).digest('hex');
const bump = (hours: number, at: number, width: number) => Math.exp(-(((hours - at) / width) ** 2));

function celsiusAt(hours: number, warmth: number): number {
	const ripple = 0.12 * Math.sin(hours * 2.1) + 0.08 * Math.sin(hours * 7.3);
	const journey =
		0.8 +
		3.4 * bump(hours, 13.4, 0.9) +
		10.6 * bump(hours, 75, 4.4) -
		1.9 * bump(hours, 90.4, 1.6) +
		3 * bump(hours, 96, 0.8);
	return Math.round((0.7 + (journey - 0.7) * warmth + ripple) * 10) / 10;
}

function seriesOf(label: string, warmth: number, isGoverning: boolean): SeriesView {
	const times: number[] = [];
	const celsius: (number | null)[] = [];
	for (let ms = fromMs; ms <= toMs; ms += stepMs) {
		const hours = (ms - fromMs) / 3_600_000;
		const isGap = label === 'L3' && hours > 42 && hours < 44.2;
		times.push(ms);
		celsius.push(isGap ? null : celsiusAt(hours, warmth));
	}
	const left = (low: number) =>
		times.map((ms) => {
			const hours = (ms - fromMs) / 3_600_000;
			return 384 - hours * 0.95 - 42 / (1 + Math.exp(-(hours - 75) / 2.4)) - low * hours * 0.12;
		});
	return {
		traceId: `trace-${label}`,
		label,
		isGoverning,
		fromAt: new Date(fromMs).toISOString(),
		toAt: new Date(toMs).toISOString(),
		times,
		celsius,
		remainingHours: left(0),
		remainingLowHours: left(1),
		remainingHighHours: left(-1),
		totalReadings: times.length
	};
}

function lineOf(ordinal: number, overrides: Partial<DocketLineView> = {}): DocketLineView {
	const lifeHours = [298, 271, 243][(ordinal - 1) % 3] ?? 243;
	return {
		id: `line-${ordinal}`,
		ordinal,
		product: ordinal % 3 === 2 ? 'Blueberries, 8 × 250 g' : 'Blueberries, 12 × 125 g',
		variety: null,
		lot: `OB-26089-${ordinal}`,
		gtin: '00614141000135',
		firstSscc: `10614141000418${400 + ordinal}2`,
		pallets: 4 + (ordinal % 4),
		casesAdvised: 640 + 160 * (ordinal % 3),
		casesReceived: 640 + 160 * (ordinal % 3),
		valueMinor: 1_280_000,
		currency: 'EUR',
		bestBeforeOn: null,
		neededHours: 264,
		fullLifeHours: 432,
		referenceCelsius: 0,
		loggers: [`L${ordinal}`],
		remainingHours: { value: lifeHours, low: lifeHours - 9, high: lifeHours + 9 },
		recommendation: null,
		outcome: {
			outcome: 'accept',
			condition: null,
			reason: null,
			cases: 640 + 160 * (ordinal % 3),
			pallets: 4 + (ordinal % 4)
		},
		...overrides
	};
}

function assessmentOf(ordinal: number, line: DocketLineView): AssessmentView {
	const warmth = ordinal === 3 ? 1 : ordinal === 2 ? 0.55 : 0.3;
	return {
		id: `assessment-${ordinal}`,
		lineId: line.id,
		traceId: `trace-L${ordinal}`,
		logger: `L${ordinal}`,
		isGoverning: true,
		engineVersion: '0.1.0',
		specId: 'spec-blueberry',
		specName: 'Blueberry, fresh',
		specVersion: 7,
		windowFromAt: new Date(fromMs).toISOString(),
		windowToAt: new Date(toMs).toISOString(),
		openingHours: { value: 48.7, low: 44.7, high: 52.7 },
		openingBasis: 'harvest to pre-cool',
		openingKind: 'declared',
		usedHours: { value: 140.9, low: 135, high: 147 },
		remainingHours: line.remainingHours ?? { value: 0, low: 0, high: 0 },
		neededHours: line.neededHours,
		fullLifeHours: line.fullLifeHours,
		accuracyCelsius: 0.5,
		upperCelsius: 4,
		lowerCelsius: -0.5,
		freezingCelsius: -1.3,
		ceilingCelsius: null,
		meanCelsius: 1.9,
		mktCelsius: 2.4,
		minCelsius: -1.1,
		maxCelsius: 11.3,
		gaps:
			ordinal === 3
				? [
						{
							fromAt: new Date(fromMs + 42 * 3_600_000).toISOString(),
							toAt: new Date(fromMs + 44.2 * 3_600_000).toISOString(),
							usedHours: 2.1
						}
					]
				: [],
		unobservedHours: ordinal === 3 ? 2.2 : 0,
		unobservedUsedHours: ordinal === 3 ? 2.1 : 0,
		belowModelHours: ordinal === 3 ? 4.2 : 0,
		aboveModelHours: 0,
		chilledHours: 0,
		trimmedHours: ordinal === 3 ? 1 : 0,
		excursions: excursionsOfJourney(fromMs, warmth),
		stops: [],
		legs: legsOfJourney(fromMs, toMs, warmth)
	};
}

function loggerOf(ordinal: number): DocketLoggerView {
	const text = rawExport(ordinal);
	return {
		label: `L${ordinal}`,
		serial: `SB-3041${ordinal}`,
		traceId: `trace-L${ordinal}`,
		readId: `read-${ordinal}`,
		status: 'found',
		position: ['Pallet 2, nose', 'Pallet 9, middle', 'Pallet 16, door end'][(ordinal - 1) % 3] ?? null,
		placement: 'in-product',
		accuracyCelsius: 0.5,
		calibrationDueOn: '2026-11-30',
		everyMinutes: 10,
		readings: 571,
		mktCelsius: 1.1 + 0.4 * ordinal,
		meanCelsius: 1.2,
		minCelsius: -1.1,
		maxCelsius: 11.3,
		gapMinutes: ordinal === 3 ? 132 : 0,
		fileName: `SB-3041${ordinal}.csv`,
		fileSha256: sha(text),
		fileBytes: text.length,
		zoneBy: 'file'
	};
}

function rawExport(ordinal: number): string {
	return `time;celsius\n2026-03-30T08:10:00+02:00;${ordinal},1\n2026-03-30T08:20:00+02:00;${ordinal},2\n`;
}

const signature = {
	signedBy: 'Ruth Calloway',
	signedByTitle: 'Quality assurance',
	meaning: 'approval' as const,
	signedAt: '2026-04-03T07:44:18.000Z',
	zone: 'Europe/Berlin',
	version: 1,
	reasons:
		'Line 3 cannot make the Easter week. Line 2 can if it goes out first. Ten berries a pallet cut on line 3: no freezing seen.',
	amendmentReason: null
};

/** A signed report's input; `lines` many lines, each with its logger, the third rejected. */
export function reportInput(overrides: Partial<ReportInput> = {}, lines = 3): ReportInput {
	const ordinals = Array.from({ length: lines }, (_, i) => i + 1);
	const views = ordinals.map((ordinal) => {
		const base = lineOf(ordinal);
		if (ordinal === 2)
			return lineOf(2, {
				outcome: {
					outcome: 'conditions',
					condition: 'ship first, by Sat 4 Apr; keep at 0 to 1 °C',
					reason: null,
					cases: 800,
					pallets: 6
				}
			});
		if (ordinal === 3)
			return lineOf(3, {
				outcome: {
					outcome: 'reject',
					condition: null,
					reason: 'short of the need by 1.3 d on the low; E2 critical',
					cases: 640,
					pallets: 7
				}
			});
		return base;
	});
	return {
		frozen: frozenDocket(views),
		signature: { ...signature, frozenSha256: sha('the frozen docket') },
		reasonTexts: {
			'line-1': ['Line life suffices: 12.0 d on the low against 11.0 d needed.'],
			'line-3': [
				'9.8 d left on the low; the need is 11.0 d.',
				'E2 is critical: 11.3 °C, 10 h 3 min above 4.0 °C, in legs D and E.',
				'Lowest reading −1.1 ±0.5 °C against a freezing stop of −1.3 °C: neither shown nor excluded.'
			]
		},
		verifyAddress: 'https://pellstaithe.example/verify/9D4020BE66864093',
		attachments: ordinals.map((ordinal) => ({
			name: `SB-3041${ordinal}.csv`,
			bytes: new TextEncoder().encode(rawExport(ordinal)),
			mediaType: 'text/csv',
			description: `Raw export of logger L${ordinal}, as uploaded`,
			relationship: 'Source' as const
		})),
		photos: [],
		organisation: 'Pell Staithe Fresh',
		pageSize: 'a4',
		creationAt: '2026-04-03T07:44:20.000Z',
		...overrides
	};
}

function frozenDocket(lines: DocketLineView[]): FrozenDocket {
	const at = (hours: number) => new Date(fromMs + hours * 3_600_000).toISOString();
	return {
		engineVersion: '0.1.0',
		frozenAt: '2026-04-03T07:44:18.000Z',
		evidenceSha256: sha('what the signer saw'),
		signature: { ...signature, dispositionId: 'disposition-1', signedById: 'user-1' },
		series: lines.map((line) =>
			seriesOf(`L${line.ordinal}`, line.ordinal === 3 ? 1 : line.ordinal === 2 ? 0.55 : 0.3, true)
		),
		docket: {
			id: 'docket-1184',
			number: 'PS-26-1184',
			title: 'Blueberries for the Easter weekend',
			verdict: 'part',
			site: {
				id: 'site-1',
				code: 'PS',
				name: 'Pell Staithe',
				gln: '9506000050010',
				zone: 'Europe/Berlin',
				temperatureUnit: 'celsius',
				address: 'Quay 4'
			},
			dock: 'Dock 1',
			supplier: { id: 'p1', name: 'Olmarisa Berry Growers', gln: null, note: null },
			carrier: { id: 'p2', name: 'Anselm Road Transport', gln: null, note: null },
			mode: 'road',
			vehicle: 'AR-4471',
			seal: '0093187',
			purchaseOrder: '450-22817',
			billOfLading: '118402',
			dueAt: null,
			hold: null,
			arrival: {
				arrivedAt: '2026-04-03T03:52:00.000Z',
				dock: 'Dock 1',
				sealFound: '0093187',
				isSealIntact: true,
				setPointCelsius: 0.5,
				returnAirCelsius: 0.9,
				conditionNote: 'Pallet 16 damp on the door side',
				driverName: 'D. Marsh',
				hasDriverSignature: true,
				loggedBy: 'D. Marsh'
			},
			lines,
			loggers: lines.map((line) => loggerOf(line.ordinal)),
			assessments: lines
				.filter((line) => line.remainingHours !== null)
				.map((line) => assessmentOf(line.ordinal, line)),
			handovers: [],
			trims: [],
			clockCorrections: [],
			pulp: [
				{
					id: 'u1',
					lineId: 'line-1',
					lot: null,
					position: 'nose',
					caseLabel: 'case 3',
					celsius: 0.8,
					text: '0.8 °C',
					instrument: 'probe 4',
					takenAt: at(96)
				},
				{
					id: 'u2',
					lineId: 'line-3',
					lot: null,
					position: 'tail',
					caseLabel: null,
					celsius: 1.4,
					text: '1.4',
					instrument: 'probe 4',
					takenAt: at(96.1)
				}
			],
			photos: [
				{
					id: 'f1',
					caption: 'Door end, pallet 16',
					kind: 'condition',
					by: 'D. Marsh',
					at: at(96),
					bytes: 123_456
				}
			],
			notes: []
		}
	};
}
