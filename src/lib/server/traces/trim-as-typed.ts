import { trimForm, type TypedTrim } from '../../schemas/trim';
import type { Context } from '../context';
import { Site } from '../db/models/site';
import { refuseFaults } from '../shipments/invalid-fields';
import { siteTime } from '../shipments/site-time';
import { getTraceFor } from './find-trace';
import { makeTrim } from './trims';

/**
 * Makes a trim whose ends were typed by the clock of the docket's site.
 * @throws InvalidFields for a time that does not exist there, or an end before its beginning
 */
export async function trimAsTyped(ctx: Context, typed: TypedTrim): Promise<string> {
	const { shipment } = await getTraceFor(ctx, typed.traceId, 'trim.make');
	const site = await Site.findByPk(shipment.siteId, { rejectOnEmpty: true });
	const issues: Record<string, string> = {};
	const instantOf = (name: 'fromAt' | 'toAt') => {
		const time = siteTime(typed[name], site.zone);
		if (time.ok) return time.at.toISOString();
		issues[name] = time.fault;
		return '';
	};
	const ends = { fromAt: instantOf('fromAt'), toAt: instantOf('toAt') };
	refuseFaults(issues);
	const trim = trimForm.safeParse({ ...typed, ...ends });
	if (trim.success) return makeTrim(ctx, trim.data);
	refuseFaults(Object.fromEntries(trim.error.issues.map((issue) => [issue.path.join('.'), issue.message])));
	throw trim.error;
}
