import type { ReadContext } from '../ingestion';

/** A correction of the logger's clock that a person may make; it is never made by itself. */
export interface ClockProposal {
	/** Whole hours apart are a time zone; anything else is a clock that drifted or was set wrong. */
	readonly kind: 'zone' | 'drift';
	/** To be added to every reading. */
	readonly shiftMs: number;
	/** Whole hours of the shift; null for a drift. */
	readonly hours: number | null;
	/** What the last reading was held against, and on which side of it it lies. */
	readonly evidence: 'after-upload' | 'after-arrival' | 'before-arrival';
}

interface Ends {
	readonly lastMs: number;
	readonly usualIntervalMs: number;
}

const msPerHour = 3_600_000;
/** "Within a few minutes": clocks of loggers and of people are no closer. */
const slackMs = 5 * 60_000;
/** The last reading stands up to one interval before the stop; longer ones would make any difference a whole hour. */
const longestIntervalMs = 10 * 60_000;
/** No two zones are further apart than this from a site. */
const mostHours = 14;
/** A logger that ended half a day before the arrival stopped early; its clock says nothing of that. */
const longestDriftMs = 12 * msPerHour;

/** Whole hours by which a moment lies after another, give or take the slack; null where they are none. */
function wholeHours(apartMs: number, intervalMs: number): number | null {
	const hours = Math.round((apartMs + intervalMs / 2) / msPerHour);
	const rest = apartMs - hours * msPerHour;
	const isWhole = rest <= slackMs && rest >= -(intervalMs + slackMs);
	return isWhole && hours !== 0 && Math.abs(hours) <= mostHours ? hours : null;
}

function zoneShift(hours: number, evidence: ClockProposal['evidence']): ClockProposal {
	return { kind: 'zone', shiftMs: -hours * msPerHour, hours: -hours, evidence };
}

/**
 * Holds the last reading against the moments at which the logger can have been stopped: the arrival where it is known,
 * the upload in any case. A reading between them proposes nothing.
 */
export function proposeClock({ lastMs, usualIntervalMs }: Ends, context: ReadContext): ClockProposal | null {
	const { uploadedMs, journeyToMs } = context;
	const arrivalMs = journeyToMs !== null && journeyToMs <= uploadedMs ? journeyToMs : null;
	const intervalMs = Math.min(usualIntervalMs, longestIntervalMs);
	if (lastMs > uploadedMs + slackMs) {
		const sinceArrival = arrivalMs === null ? null : wholeHours(lastMs - arrivalMs, intervalMs);
		if (sinceArrival !== null) return zoneShift(sinceArrival, 'after-arrival');
		const sinceUpload = wholeHours(lastMs - uploadedMs, intervalMs);
		if (sinceUpload !== null) return zoneShift(sinceUpload, 'after-upload');
		return { kind: 'drift', shiftMs: uploadedMs - lastMs, hours: null, evidence: 'after-upload' };
	}
	if (arrivalMs === null || lastMs >= arrivalMs - usualIntervalMs - slackMs) return null;
	const short = wholeHours(lastMs - arrivalMs, intervalMs);
	if (short !== null) return zoneShift(short, 'before-arrival');
	return arrivalMs - lastMs > longestDriftMs
		? null
		: { kind: 'drift', shiftMs: arrivalMs - lastMs, hours: null, evidence: 'before-arrival' };
}
