import { isoDay, time } from '$lib/format-time';
import type { DocketView, LineOutcomeView } from '$lib/schemas/docket';

type Line = DocketView['lines'][number];

/** A group as the form holds it: every field as text, by the name it is sent under. */
export interface GroupFields {
	outcome: string;
	name: string;
	cases: string;
	pallets: string;
	whereabouts: string;
	place: string;
	conditionKind: string;
	condition: string;
	awaited: string;
	until: string;
	reason: string;
}

const textOf = (value: unknown) => (value === null || value === undefined ? '' : String(value));

const fieldNames = [
	...(['outcome', 'name', 'cases', 'pallets', 'whereabouts', 'place'] as const),
	...(['conditionKind', 'condition', 'awaited', 'until', 'reason'] as const)
];

/** What was sent or signed before, as the form holds it. */
export function groupFields(known: Record<string, unknown>): GroupFields {
	const entries = fieldNames.map((name) => [name, textOf(known[name])]);
	return Object.fromEntries(entries) as GroupFields;
}

/** An instant as a field for local time holds it, by the site's clock. */
const wallTime = (at: string, zone: string) => `${isoDay(at, zone)}T${time(at, zone)}`;

interface Beginning {
	suggestedReason: string;
	zone: string;
	/** The open hold of a docket that is not signed. */
	hold: DocketView['hold'];
}

/**
 * What the page begins with for a line: the signed groups, held ones with what they await and until when; else the
 * recommendation, with the open hold's words ready where it is chosen again; else nothing chosen.
 */
export function beginningGroups(line: Line, { suggestedReason, zone, hold }: Beginning): GroupFields[] {
	const until = (at: string | null | undefined) => (at ? wallTime(at, zone) : '');
	const signed: readonly LineOutcomeView[] = line.groups ?? (line.outcome ? [line.outcome] : []);
	if (signed.length > 0) return signed.map((group) => groupFields({ ...group, until: until(group.untilAt) }));
	const recommended = line.recommendation?.recommended;
	const outcome = recommended === 'hold' ? '' : (recommended ?? '');
	const held = { awaited: hold?.awaited, until: until(hold?.untilAt) };
	return [groupFields({ outcome, reason: suggestedReason, ...held })];
}

/** How many groups of each line an address asks for: `?split=1.3` is line 1 in three; faults count as not asked. */
export function askedGroups(split: string | null): ReadonlyMap<number, number> {
	const asked = [...(split ?? '').matchAll(/(\d{1,4})\.(\d{1,2})/g)].map(
		([, line, groups]) => [Number(line), Math.min(Math.max(Number(groups), 1), mostGroups)] as const
	);
	return new Map(asked);
}

/** More groups than a line has pallets on a trailer. */
export const mostGroups = 40;

/** The groups of a line brought to a number: further ones begin empty, and the first then takes no counts for granted. */
export function withGroups(groups: readonly GroupFields[], wanted: number): GroupFields[] {
	const kept = groups.slice(0, Math.max(wanted, 1));
	const more = Array.from({ length: Math.max(0, wanted - kept.length) }, () => groupFields({}));
	return [...kept, ...more];
}

/** "90 of 96 cases, 4 of 4 pallets": how far the groups add up. */
export function addedUp(line: Line, groups: readonly GroupFields[]): { text: string; isEqual: boolean } {
	const received = { cases: line.casesReceived ?? line.casesAdvised, pallets: line.pallets };
	const sum = (unit: 'cases' | 'pallets') =>
		groups.reduce((total, group) => total + (Number(group[unit]) || 0), 0);
	const units = received.pallets > 0 ? (['cases', 'pallets'] as const) : (['cases'] as const);
	return {
		text: units.map((unit) => `${sum(unit)} of ${received[unit]} ${unit}`).join(', '),
		isEqual: units.every((unit) => sum(unit) === received[unit])
	};
}
