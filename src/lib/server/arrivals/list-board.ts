import { Op } from 'sequelize';
import { isoDay } from '../../format-time';
import type { BoardDay, BoardQuery, BoardRow, BoardView } from '../../schemas/board';
import { stages } from '../../schemas/docket';
import type { Context } from '../context';
import { Shipment } from '../db/models/shipment';
import type { Site } from '../db/models/site';
import { authorize } from '../policies';
import { getOwnSite } from '../shipments/own-site';
import { findBoardFacts, type BoardFacts } from './board-facts';
import { boardRow } from './board-row';
import { dayBefore, docksOf, openingOf, spanOfDay } from './site-day';

/** A load that is this late is still waited for on today's board; later it is looked for in the dockets. */
const daysWaitedFor = 1;

/** The day's loads: those due or arrived on it; today also what is still open from before. */
async function findLoads(site: Site, dayOn: string, isToday: boolean): Promise<Shipment[]> {
	const { from, to } = spanOfDay(dayOn, site.zone);
	const onTheDay = { [Op.gte]: from, [Op.lt]: to };
	const late = spanOfDay(dayBefore(dayOn, daysWaitedFor), site.zone).from;
	const stillOpen = [
		{ arrivedAt: { [Op.lt]: from }, decidedAt: null },
		{ arrivedAt: null, dueAt: { [Op.gte]: late, [Op.lt]: from } }
	];
	return Shipment.findAll({
		where: {
			siteId: site.id,
			cancelledAt: null,
			[Op.or]: [
				{ arrivedAt: onTheDay },
				{ arrivedAt: null, dueAt: onTheDay },
				// A load of this day that came early or late on another day is that day's.
				...(isToday ? stillOpen : [])
			]
		},
		order: [
			['dueAt', 'ASC'],
			['number', 'ASC']
		]
	});
}

function isWanted(row: BoardRow, shipment: Shipment, facts: BoardFacts, query: BoardQuery): boolean {
	const lines = facts.lines.get(row.id) ?? [];
	if (query.dock !== null && row.dock !== query.dock) return false;
	if (query.carrier !== null && shipment.carrierId !== query.carrier) return false;
	if (query.product !== null && !lines.some((line) => line.productId === query.product)) return false;
	if (query.mine === true && !row.next.isMine) return false;
	if (query.q === null) return true;
	const names = lines.flatMap((line) => [line.lot, facts.products.get(line.productId)?.name]);
	const words = [row.number, row.supplier, row.carrier, row.vehicle, shipment.seal, shipment.title, ...names];
	return words.join('\n').toLowerCase().includes(query.q.toLowerCase());
}

/** Done loads newest first; the others as they are due. */
function inOrder(rows: BoardRow[]): BoardRow[] {
	const done = rows.filter((row) => row.stage === 'done').reverse();
	return [...rows.filter((row) => row.stage !== 'done'), ...done];
}

async function countDays(site: Site, dayOn: string, todayOn: string): Promise<BoardDay[]> {
	const shown = [...new Set([dayOn, dayBefore(todayOn, -1), todayOn, dayBefore(todayOn)])];
	const order = [todayOn, dayBefore(todayOn, -1), dayBefore(todayOn)];
	const days = [...new Set([dayOn, ...order])].filter((on) => shown.includes(on));
	return Promise.all(
		days.map(async (on) => {
			const loads = await findLoads(site, on, on === todayOn);
			const done = loads.filter((load) => load.decidedAt !== null).length;
			return { on, loads: loads.length, done, isShown: on === dayOn };
		})
	);
}

function named(map: Map<string, string>, ids: readonly (string | null)[]) {
	return [...new Set(ids.filter((id) => id !== null))]
		.map((id) => ({ id, name: map.get(id) ?? '' }))
		.sort((a, b) => a.name.localeCompare(b.name, 'en'));
}

/** The arrivals board of one of the actor's sites, for a day of that site's calendar. */
export async function listBoard(ctx: Context, siteId: string, query: BoardQuery): Promise<BoardView> {
	authorize(ctx, 'shipment.list');
	const site = await getOwnSite(ctx, siteId);
	const todayOn = isoDay(ctx.now, site.zone);
	const dayOn = query.day ?? todayOn;
	const loads = await findLoads(site, dayOn, dayOn === todayOn);
	const facts = await findBoardFacts(loads);
	const all = loads.map((load) => ({ load, row: boardRow(ctx.actor, load, facts) }));
	const wanted = all.filter(({ load, row }) => isWanted(row, load, facts, query));
	const countOf = (stage: string) => all.filter(({ row }) => row.stage === stage).length;
	const productNames = new Map([...facts.products].map(([id, { name }]) => [id, name]));
	return {
		dayOn,
		isToday: dayOn === todayOn,
		...(await openingOf(site, dayOn)),
		docks: docksOf(site),
		rows: inOrder(wanted.map(({ row }) => row)),
		counts: {
			expected: countOf(stages[0]),
			'at-the-door': countOf(stages[1]),
			'on-hold': countOf(stages[2]),
			done: countOf(stages[3]),
			mine: all.filter(({ row }) => row.next.isMine).length,
			all: all.length
		},
		products: named(productNames, [...facts.products.keys()]),
		carriers: named(
			facts.partners,
			loads.map((load) => load.carrierId)
		),
		days: await countDays(site, dayOn, todayOn)
	};
}
