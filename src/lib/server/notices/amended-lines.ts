import { decidedGroups } from '../../domain/receiving/line-groups';
import { count } from '../../format';
import type { FrozenDocket, LineOutcomeView } from '../../schemas/docket';

type Line = FrozenDocket['docket']['lines'][number];

const words = { accept: 'accepted', conditions: 'accepted with conditions', hold: 'held', reject: 'refused' };

const groupText = ({ outcome, cases, condition, conditionKind }: LineOutcomeView) =>
	`${count(cases, 'en')} cases ${words[outcome]}${condition || conditionKind ? ` (${condition ?? conditionKind})` : ''}`;

const lineText = (line: Line | undefined) =>
	line ? decidedGroups(line).map(groupText).join(', ') : 'not on the docket';

/** What a new version decides otherwise, a sentence a line: "Line 2: 640 cases refused, now 640 cases accepted". */
export function amendedLines(before: readonly Line[], after: readonly Line[]): string[] {
	return after.flatMap((line) => {
		const was = lineText(before.find(({ id }) => id === line.id));
		const is = lineText(line);
		return was === is ? [] : [`Line ${line.ordinal}: ${was}, now ${is}.`];
	});
}
