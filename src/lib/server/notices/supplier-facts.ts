import { groupDetails } from '../../messages/en/line-groups';
import type { FrozenDocket, AssessmentView, LineOutcomeView } from '../../schemas/docket';
import type { SupplierDocketView, SupplierExcursionView, SupplierLineView } from '../../schemas/supplier';

type Docket = FrozenDocket['docket'];

/** The assessment that decided: of the line with the least life left on the low. */
export function decidingAssessment(docket: Docket): AssessmentView | null {
	const governing = docket.assessments.filter((assessment) => assessment.isGoverning);
	return governing.reduce<AssessmentView | null>(
		(least, one) => (least && least.remainingHours.low <= one.remainingHours.low ? least : one),
		null
	);
}

/** The supplier's own time with the goods ends where custody first passes on. */
export function handedOverAt(docket: Docket): string | null {
	const next = docket.handovers[1];
	return next?.actualAt ?? next?.plannedAt ?? null;
}

function excursionViews(docket: Docket, assessment: AssessmentView | null): SupplierExcursionView[] {
	const left = handedOverAt(docket);
	const leftMs = left === null ? null : Date.parse(left);
	return (assessment?.excursions ?? []).map((excursion, index) => ({
		name: `E${index + 1}`,
		kind: excursion.kind,
		severity: excursion.severity,
		fromAt: new Date(excursion.fromMs).toISOString(),
		toAt: new Date(excursion.toMs).toISOString(),
		minutes: excursion.minutes,
		extremeCelsius: excursion.extremeCelsius,
		limitCelsius: excursion.limitCelsius,
		costHours: excursion.costHours,
		isInOwnHands: leftMs !== null && excursion.fromMs < leftMs
	}));
}

/** Whose hands the goods passed through later is not the supplier's to know. */
function withoutNames(assessment: AssessmentView): AssessmentView {
	const legs = assessment.legs.map((leg) => ({
		...leg,
		holder: leg.ordinal === 1 ? 'yours' : '',
		place: '',
		handoverId: ''
	}));
	return { ...assessment, legs };
}

/** Refused goods are the supplier's to fetch, so it hears where they are; of the rest the place is the house's own. */
function toldGroup(group: LineOutcomeView): LineOutcomeView {
	return group.outcome === 'reject' ? group : { ...group, whereabouts: null, place: null };
}

function rangePartsOf({ assessments }: Docket, lineId: string): Pick<SupplierLineView, 'rangeParts'> {
	const governing = assessments.find((one) => one.isGoverning && one.lineId === lineId);
	return governing?.rangeParts ? { rangeParts: governing.rangeParts } : {};
}

/** What a supplier may know of a signed docket, from the frozen record alone. */
export function supplierFacts(frozen: FrozenDocket): Omit<SupplierDocketView, 'report' | 'notice'> {
	const { docket, signature } = frozen;
	const assessment = decidingAssessment(docket);
	const logger = docket.loggers.find((candidate) => candidate.label === assessment?.logger) ?? null;
	return {
		id: docket.id,
		number: docket.number,
		title: docket.title,
		purchaseOrder: docket.purchaseOrder,
		siteName: docket.site.name,
		zone: docket.site.zone,
		temperatureUnit: docket.site.temperatureUnit,
		referenceCelsius: docket.lines[0]?.referenceCelsius ?? 0,
		arrivedAt: docket.arrival?.arrivedAt ?? signature.signedAt,
		verdict: docket.verdict ?? 'accepted',
		version: signature.version,
		signedAt: signature.signedAt,
		lines: docket.lines.map((line) => ({
			ordinal: line.ordinal,
			product: line.product,
			lot: line.lot,
			cases: line.outcome?.cases ?? line.casesReceived ?? line.casesAdvised,
			remainingHours: line.remainingHours,
			neededHours: line.neededHours,
			fullLifeHours: line.fullLifeHours,
			outcome: line.outcome?.outcome ?? null,
			condition: line.outcome?.condition ?? null,
			reason: line.outcome?.reason ?? null,
			...(line.groups ? { groups: line.groups.map(toldGroup) } : {}),
			...(line.outcome ? { details: groupDetails(toldGroup(line.outcome), docket.site.zone) } : {}),
			...rangePartsOf(docket, line.id)
		})),
		logger: logger ? { label: logger.label, placement: logger.placement } : null,
		excursions: excursionViews(docket, assessment),
		assessment: assessment && withoutNames(assessment),
		series: frozen.series.filter((series) => series.label === assessment?.logger),
		handedOverAt: handedOverAt(docket),
		openingHours: assessment?.openingHours.value ?? null,
		openingKind: assessment?.openingKind ?? 'undeclared',
		reads: docket.loggers.flatMap((one) =>
			one.readId && one.fileName
				? [{ id: one.readId, label: one.label, fileName: one.fileName, bytes: one.fileBytes ?? 0 }]
				: []
		),
		photos: docket.photos.map(({ id, caption, bytes }) => ({ id, caption, bytes }))
	};
}
