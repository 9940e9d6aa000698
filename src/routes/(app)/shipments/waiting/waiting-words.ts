import type { TemperatureUnit } from '$lib/domain/units';
import { duration, lifeDays, temperature, temperatureSign } from '$lib/format';
import { dayTime, zoneName } from '$lib/format-time';
import type { QueueClock, QueueRow, QueueView } from '$lib/schemas/queue';

export const sortOptions = [
	{ value: 'clock', label: 'Clock that runs' },
	{ value: 'life', label: 'Life to spare' },
	{ value: 'arrived', label: 'Longest here' }
] as const;

/** The filters with their counts. */
export function showOptions({ counts }: QueueView) {
	return [
		{ value: 'ready', label: `Ready for QA ${counts.ready}` },
		{ value: 'all', label: `All that came in ${counts.all}` }
	];
}

export function takerOptions({ counts }: QueueView) {
	return [
		{ value: 'any', label: 'Anybody' },
		{ value: 'me', label: `Me ${counts.mine}` },
		{ value: 'nobody', label: `Nobody ${counts.nobody}` }
	];
}

const acts: Record<QueueClock['kind'], string> = {
	reject: 'to refuse it',
	notice: 'to give notice',
	life: 'of life to spare',
	hold: 'of the hold'
};

/** How long the clock still runs: "4 h 17 min", "2 h 5 min late". */
export function clockText(clock: QueueClock | null, nowMs: number): string {
	if (clock === null) return 'no clock';
	const leftMs = Date.parse(clock.deadlineAt) - nowMs;
	return leftMs < 0 ? `${duration(-leftMs)} late` : duration(leftMs);
}

/** What the clock is for, and until when. */
export function clockNote(clock: QueueClock | null, zone: string): string {
	if (clock === null) return '';
	return `${acts[clock.kind]}, till ${dayTime(clock.deadlineAt, zone, 'en')} ${zoneName(clock.deadlineAt, zone)}`;
}

/** Why it is not simply accepted: the gravest finding, else how many reads are in. */
export function findingLine({ finding, reads, life }: QueueRow, unit: TemperatureUnit): string {
	if (finding?.kind === 'excursion')
		return `E${finding.ordinal} ${finding.severity}, ${temperature(finding.extremeCelsius, unit, 'en')} ${temperatureSign(unit)}`;
	if (finding?.kind === 'short')
		return `low of ${lifeDays(finding.lowHours, 'en')} d, need ${lifeDays(finding.neededHours, 'en')} d`;
	if (finding?.kind === 'question') return `a question about ${finding.fileName}`;
	if (life === null) return reads.due === 0 ? 'no logger: life not known' : 'life not known yet';
	return 'nothing found';
}

export function readsLine({ reads }: QueueRow): string {
	return reads.due === 0 ? 'no logger' : `${reads.kept} of ${reads.due} read`;
}
