import type { RetentionRule } from '../../schemas/retention';
import type { Context } from '../context';
import { authorize } from '../policies';
import { dueChains, dueFiles } from './due';
import { getPeriods } from './periods';

const monthMs = 30 * 24 * 3_600_000;
/** How far ahead the preview looks. */
const aheadMs = 6 * monthMs;
const shownAtMost = 200;

export interface RetentionLine {
	rule: RetentionRule;
	docket: string | null;
	what: string;
	dueAt: string;
	isHeld: boolean;
}

/** What would go, and when: everything that falls due within half a year, soonest first. */
export async function previewRetention(ctx: Context): Promise<{ lines: RetentionLine[]; total: number }> {
	authorize(ctx, 'retention.manage');
	const until = { periods: await getPeriods(), now: ctx.now, before: new Date(ctx.now.getTime() + aheadMs) };
	const [files, chains] = await Promise.all([dueFiles(until), dueChains(until)]);
	const lines: RetentionLine[] = [
		...files.map(({ rule, docket, what, dueAt, isHeld }) => ({
			rule,
			docket,
			what,
			dueAt: dueAt.toISOString(),
			isHeld
		})),
		...chains.map(({ docket, scope, entries, dueAt, isHeld }) => ({
			rule: 'people' as const,
			docket,
			what: `${entries} ${entries === 1 ? 'entry' : 'entries'} about people${docket ? '' : `, ${scope}`}`,
			dueAt: dueAt.toISOString(),
			isHeld
		}))
	];
	lines.sort((a, b) => a.dueAt.localeCompare(b.dueAt));
	return { lines: lines.slice(0, shownAtMost), total: lines.length };
}
