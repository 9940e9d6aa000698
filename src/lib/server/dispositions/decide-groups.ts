import { msPerHour } from '../../domain/units';
import {
	countFault,
	gravestOutcome,
	groupCounts,
	usualWhereabouts
} from '../../domain/receiving/line-groups';
import { countFaultText } from '../../messages/en/line-groups';
import type { DispositionInput } from '../../schemas/disposition';
import type { DocketLineView, DocketView, LineOutcomeView } from '../../schemas/docket';
import { Refusal } from '../refusals';
import { siteTime } from '../shipments/site-time';

type Written = DispositionInput['lines'][number];

/** A line with what becomes of each of its groups; a whole line has one. */
export interface DecidedLine {
	line: DocketLineView;
	groups: LineOutcomeView[];
}

/** A year of a hold is a slip of the pen. */
const longestHoldMs = 366 * 24 * msPerHour;

function untilOf({ outcome, until }: Written, line: DocketLineView, docket: DocketView, now: Date) {
	if (outcome !== 'hold' || !until) return null;
	const typed = siteTime(until, docket.site.zone);
	if (!typed.ok) throw new Refusal('invalid', `Line ${line.ordinal}, held until: ${typed.fault}`);
	const aheadMs = typed.at.getTime() - now.getTime();
	if (aheadMs <= 0)
		throw new Refusal('invalid', `Line ${line.ordinal}: the time it is held until has passed already.`);
	if (aheadMs > longestHoldMs)
		throw new Refusal('invalid', `Line ${line.ordinal}: it would be held for more than a year.`);
	return typed.at.toISOString();
}

function groupsOf(line: DocketLineView, docket: DocketView, rows: readonly Written[], now: Date) {
	const received = { cases: line.casesReceived ?? line.casesAdvised, pallets: line.pallets };
	const fault = countFault(received, rows);
	if (fault) throw new Refusal('invalid', countFaultText(line.ordinal, fault));
	const counts = groupCounts(received, rows);
	return rows.map((row, index): LineOutcomeView => ({
		outcome: row.outcome,
		condition: row.condition,
		reason: row.reason,
		...(counts[index] ?? received),
		name: row.name ?? (rows.length > 1 ? `Group ${index + 1}` : ''),
		conditionKind: row.conditionKind ?? null,
		awaited: row.awaited ?? null,
		untilAt: untilOf(row, line, docket, now),
		whereabouts: row.whereabouts ?? usualWhereabouts(row.outcome),
		place: row.place ?? null
	}));
}

/** Every line with its groups, their counts adding up to what was received. @throws Refusal `invalid` saying what does not */
export function decideGroups(docket: DocketView, rows: DispositionInput['lines'], now: Date): DecidedLine[] {
	return docket.lines.map((line) => ({
		line,
		groups: groupsOf(
			line,
			docket,
			rows.filter((row) => row.lineId === line.id),
			now
		)
	}));
}

/** The line as it is shown once decided: its one outcome, and its groups where it was split. */
export function outcomeOf(groups: readonly LineOutcomeView[]): Pick<DocketLineView, 'outcome' | 'groups'> {
	const [first] = groups;
	if (!first) return { outcome: null };
	if (groups.length === 1) return { outcome: first };
	const outcome = gravestOutcome(groups.map((group) => group.outcome));
	const total = (unit: 'cases' | 'pallets') => groups.reduce((sum, group) => sum + group[unit], 0);
	const decisive = groups.find((group) => group.outcome === outcome) ?? first;
	return {
		outcome: { ...decisive, name: '', cases: total('cases'), pallets: total('pallets') },
		groups: [...groups]
	};
}

/** What is held of a load, as one open hold says it; null where nothing is. */
export function heldOf(
	decided: readonly DecidedLine[]
): { reason: string; awaited: string; untilAt: Date | null } | null {
	const held = decided.flatMap(({ line, groups }) =>
		groups.filter((group) => group.outcome === 'hold').map((group) => ({ line, group }))
	);
	if (held.length === 0) return null;
	const first = held
		.flatMap(({ group }) => (group.untilAt ? [group.untilAt] : []))
		.reduce<string | null>((least, at) => (least === null || at < least ? at : least), null);
	const whatOf = ({ line, group }: (typeof held)[number]) =>
		`line ${line.ordinal}: ${group.pallets > 0 ? `${group.pallets} pallets` : `${group.cases} cases`}${group.reason ? `, ${group.reason}` : ''}`;
	return {
		reason: held.map(whatOf).join('; '),
		awaited: [...new Set(held.flatMap(({ group }) => (group.awaited ? [group.awaited] : [])))]
			.join('; ')
			.slice(0, 400),
		untilAt: first === null ? null : new Date(first)
	};
}
