import { Op, literal, type Order, type WhereOptions } from 'sequelize';
import type { LoggerQuery } from '../../schemas/logger';
import { inState, pageOf, searchIn } from '../catalogue/search';
import type { Context } from '../context';
import { Logger } from '../db/models/logger';
import { Partner } from '../db/models/partner';
import { authorize } from '../policies';
import { loggerView, type LoggerView } from './views';

const sortColumns = { serial: 'serial', due: 'calibrationDueOn', accuracy: 'accuracyCelsius' } as const;

function where(query: LoggerQuery, todayOn: string): WhereOptions<Logger> {
	const isOverdue = query.state === 'overdue';
	return {
		...searchIn<Logger>(['serial', 'note'], query.q),
		...inState(isOverdue ? 'in-use' : query.state),
		...(isOverdue ? { calibrationDueOn: { [Op.lt]: todayOn } } : {}),
		...(query.kind === 'any' ? {} : { kind: query.kind })
	} as WhereOptions<Logger>;
}

function order(query: LoggerQuery): Order {
	// A logger without a due day comes last either way: there is nothing to do about it.
	const nullsLast: Order = query.sort === 'due' ? [[literal('calibration_due_on IS NULL'), 'asc']] : [];
	return [...nullsLast, [sortColumns[query.sort], query.dir], ['serial', 'asc']];
}

/** The register of instruments. `todayOn` is the day at the reader's site. @throws Refusal `not-allowed` */
export async function listLoggers(
	ctx: Context,
	query: LoggerQuery,
	todayOn: string
): Promise<{ items: LoggerView[]; total: number; overdue: number }> {
	authorize(ctx, 'catalogue.view');
	const { rows, count } = await Logger.findAndCountAll({
		where: where(query, todayOn),
		order: order(query),
		...pageOf(query)
	});
	const ownerIds = rows.flatMap(({ ownerId }) => ownerId ?? []);
	const owners = await Partner.findAll({ attributes: ['id', 'name'], where: { id: ownerIds } });
	const names = new Map(owners.map(({ id, name }) => [id, name]));
	const overdue = await Logger.count({
		where: { switchedOffAt: null, calibrationDueOn: { [Op.lt]: todayOn } }
	});
	const items = rows.map((logger) => loggerView(logger, names.get(logger.ownerId ?? '') ?? null, todayOn));
	return { items, total: count, overdue };
}
