import type { Evidence } from './evidence';
import type { Reason } from './recommendation';

/** Pulp and the last readings are expected to agree within this beside the logger's accuracy. Practice: ±1 °C probes. */
const pulpAgreementCelsius = 1;

/** Each pulp reading above the upper limit, or above the ceiling where the spec sets no limit. */
export function pulpLimitReasons({ spec, pulp }: Evidence): Reason[] {
	const limitCelsius = spec.upper?.celsius ?? spec.ceilingCelsius;
	if (limitCelsius === null) return [];
	return pulp
		.filter((reading) => reading.celsius > limitCelsius)
		.map(({ celsius, position }) => ({
			code: 'pulp-above-limit',
			grade: 'hold',
			pulpCelsius: celsius,
			limitCelsius,
			position
		}));
}

/** A seal that was not intact. */
export function sealReasons({ seal }: Evidence): Reason[] {
	return seal === null || seal.isIntact ? [] : [{ code: 'seal-broken', grade: 'hold', seal: seal.text }];
}

/** Two loggers farther apart than their accuracies allow. */
export function disagreementReasons({ disagreement }: Evidence): Reason[] {
	if (disagreement === null || disagreement.differenceCelsius <= disagreement.allowedCelsius) return [];
	return [{ code: 'loggers-disagree', grade: 'hold', ...disagreement }];
}

/** The pulp reading farthest from the last reading of the trace, where it is too far. */
export function pulpAgainstTraceReasons({ assessment, pulp, accuracyCelsius }: Evidence): Reason[] {
	const celsius = assessment?.series.celsius;
	const traceCelsius = celsius?.[celsius.length - 1];
	if (traceCelsius === undefined) return [];
	const apart = (reading: { readonly celsius: number }) => Math.abs(reading.celsius - traceCelsius);
	const worst = [...pulp].sort((a, b) => apart(b) - apart(a))[0];
	if (worst === undefined || apart(worst) <= accuracyCelsius + pulpAgreementCelsius) return [];
	return [{ code: 'pulp-against-air', grade: 'note', pulpCelsius: worst.celsius, traceCelsius }];
}

/** A count that differs from the papers. */
export function caseReasons({ cases }: Evidence): Reason[] {
	return cases === null || cases.advised === cases.received
		? []
		: [{ code: 'cases-differ', grade: 'note', ...cases }];
}

/** A calibration due on the day of arrival still holds on that day. */
export function calibrationReasons({ calibrations, arrivedOn }: Evidence): Reason[] {
	return calibrations.flatMap(({ serial, dueOn }) =>
		dueOn !== null && dueOn < arrivedOn ? [{ code: 'calibration-overdue', grade: 'note', serial, dueOn }] : []
	);
}
