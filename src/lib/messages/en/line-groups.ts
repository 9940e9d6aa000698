import type { ConditionKind, CountFault, Whereabouts } from '../../domain/receiving/line-groups';
import type { PartQuantities } from '../../domain/receiving/quantities';
import type { LineOutcomeView } from '../../schemas/docket';
import { count } from '../../format';
import { dayTime, zoneName } from '../../format-time';

export const conditionWords: Record<ConditionKind, string> = {
	'shorter-date': 'shorter date',
	'sort-rework': 'sort and rework',
	'use-first': 'use first',
	'nearer-customer': 'to a nearer customer',
	concession: 'buyer’s concession'
};

export const whereaboutsWords: Record<Whereabouts, string> = {
	dock: 'at the dock',
	store: 'in the store',
	quarantine: 'in quarantine',
	returned: 'returned',
	dumped: 'dumped'
};

const unitWords = { cases: 'cases', pallets: 'pallets' } as const;

/** Why a line's groups cannot be signed: "the groups come to 95 cases; 96 were received". */
export function countFaultText(ordinal: number, fault: CountFault): string {
	if (fault.code === 'count-missing')
		return `Line ${ordinal}, group ${fault.group}: write its ${unitWords[fault.unit]}.`;
	if (fault.code === 'group-empty')
		return `Line ${ordinal}, group ${fault.group} has no cases. Leave it out, or give it some.`;
	const { unit, grouped, received } = fault;
	return `Line ${ordinal}: the groups come to ${count(grouped, 'en')} ${unitWords[unit]}; ${count(received, 'en')} were received. They must add up.`;
}

/** "12 pallets in, 4 refused, 2 on hold". */
export function partText({ unit, taken, refused, held }: PartQuantities): string {
	const parts = [
		...(taken > 0 || refused > 0 ? [`${count(taken, 'en')} ${unit} in`] : []),
		...(refused > 0 || held === 0 ? [`${count(refused, 'en')} refused`] : []),
		...(held > 0 ? [`${count(held, 'en')}${taken > 0 || refused > 0 ? '' : ` ${unit}`} on hold`] : [])
	];
	return parts.join(', ');
}

/** Where goods are: "in quarantine, Q2". */
export function placeText({ whereabouts, place }: Pick<LineOutcomeView, 'whereabouts' | 'place'>): string {
	const kind = whereabouts ? whereaboutsWords[whereabouts] : null;
	return [kind, place].filter(Boolean).join(', ');
}

/** What a group's outcome comes with: its condition, what is awaited, why, and where the goods are. */
export function groupDetails(group: LineOutcomeView, zone: string): string {
	const { condition, conditionKind, reason, awaited, untilAt } = group;
	const kind = conditionKind ? conditionWords[conditionKind] : null;
	const until = untilAt ? ` until ${dayTime(untilAt, zone, 'en')} ${zoneName(untilAt, zone)}` : '';
	return [
		[kind, condition].filter(Boolean).join(': '),
		awaited || until ? `awaits ${awaited ?? 'a decision'}${until}` : '',
		reason ?? '',
		placeText(group)
	]
		.filter(Boolean)
		.join('; ');
}
