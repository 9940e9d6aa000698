import { Op } from 'sequelize';
import type { QueueQuery, QueueRow, QueueView } from '../../schemas/queue';
import { findBoardFacts, type BoardFacts } from '../arrivals/board-facts';
import { boardRow } from '../arrivals/board-row';
import type { Context } from '../context';
import { Clock } from '../db/models/clock';
import { Hold } from '../db/models/hold';
import { Shipment } from '../db/models/shipment';
import { User } from '../db/models/user';
import { authorize } from '../policies';
import { getOwnSite } from '../shipments/own-site';
import { runningClock } from './running-clock';

/** Every load of one site that came in and is not decided, or of which a part is still held. */
async function findWaiting(siteId: string): Promise<Shipment[]> {
	const here = { siteId, cancelledAt: null };
	const [undecided, held] = await Promise.all([
		Shipment.findAll({ where: { ...here, decidedAt: null, arrivedAt: { [Op.not]: null } } }),
		findPartlyHeld(here)
	]);
	return [...undecided, ...held].sort(
		(a, b) => (a.arrivedAt?.getTime() ?? 0) - (b.arrivedAt?.getTime() ?? 0)
	);
}

async function findPartlyHeld(here: { siteId: string; cancelledAt: null }): Promise<Shipment[]> {
	const open = await Hold.findAll({ where: { liftedAt: null }, attributes: ['shipmentId'] });
	return Shipment.findAll({
		where: { ...here, id: open.map((hold) => hold.shipmentId), decidedAt: { [Op.not]: null } }
	});
}

/** What is left to do with a load signed in part: to decide what is held, which is an amendment. */
function nextOf(row: QueueRow['next'], shipment: Shipment): QueueRow['next'] {
	if (shipment.decidedAt === null) return row;
	return { ...row, act: 'review', href: `/shipments/${shipment.number}/sign?amend`, isMine: true };
}

async function findTakers(waiting: readonly Shipment[]): Promise<Map<string, string>> {
	const ids = [...new Set(waiting.map((row) => row.takenBy).filter((id) => id !== null))];
	const users = await User.findAll({ where: { id: { [Op.in]: ids } }, attributes: ['id', 'name'] });
	return new Map(users.map((user) => [user.id, user.name]));
}

async function queueRows(ctx: Context, waiting: readonly Shipment[], facts: BoardFacts): Promise<QueueRow[]> {
	const [takers, clocks] = await Promise.all([
		findTakers(waiting),
		Clock.findAll({
			where: { shipmentId: { [Op.in]: waiting.map((row) => row.id) }, claimId: null, metAt: null }
		})
	]);
	return waiting.map((shipment) => {
		const row = boardRow(ctx.actor, shipment, facts);
		const own = clocks.filter((clock) => clock.shipmentId === shipment.id);
		return {
			...row,
			takenBy:
				shipment.takenBy === null ? null : { id: shipment.takenBy, name: takers.get(shipment.takenBy) ?? '' },
			next: nextOf(row.next, shipment),
			clock: runningClock(
				own,
				shipment.decidedAt === null ? row.life : null,
				shipment.arrivedAt,
				facts.holds.get(shipment.id) ?? []
			)
		};
	});
}

/** Life to spare on the low; a load whose life is not known stands after those whose life is. */
function roomHours({ life }: QueueRow): number {
	return life === null ? Infinity : life.lowHours - life.neededHours;
}

/** In the order asked for; a load without a clock waits behind all that have one, then the longest waiting first. */
function inOrder(rows: QueueRow[], sort: QueueQuery['sort']): QueueRow[] {
	const byArrival = (a: QueueRow, b: QueueRow) => (a.arrivedAt ?? '').localeCompare(b.arrivedAt ?? '');
	const byClock = (a: QueueRow, b: QueueRow) =>
		(a.clock?.deadlineAt ?? '9').localeCompare(b.clock?.deadlineAt ?? '9');
	const byLife = (a: QueueRow, b: QueueRow) => {
		const [left, right] = [roomHours(a), roomHours(b)];
		return left === right ? 0 : left - right;
	};
	const first = { clock: byClock, arrived: byArrival, life: byLife }[sort];
	return [...rows].sort((a, b) => first(a, b) || byArrival(a, b) || a.number.localeCompare(b.number));
}

function isWanted(ctx: Context, row: QueueRow, shipment: Shipment, facts: BoardFacts, query: QueueQuery) {
	const lines = facts.lines.get(row.id) ?? [];
	if (query.show === 'ready' && !row.next.isMine) return false;
	if (query.taken === 'me' && row.takenBy?.id !== ctx.actor.id) return false;
	if (query.taken === 'nobody' && row.takenBy !== null) return false;
	if (query.supplier !== null && shipment.supplierId !== query.supplier) return false;
	if (query.product !== null && !lines.some((line) => line.productId === query.product)) return false;
	if (query.q === null) return true;
	const names = lines.flatMap((line) => [line.lot, facts.products.get(line.productId)?.name]);
	const words = [row.number, row.supplier, row.carrier, row.vehicle, shipment.seal, shipment.title, ...names];
	return words.join('\n').toLowerCase().includes(query.q.toLowerCase());
}

function named(pairs: Iterable<readonly [string, string]>): { id: string; name: string }[] {
	return [...new Map(pairs)]
		.map(([id, name]) => ({ id, name }))
		.sort((a, b) => a.name.localeCompare(b.name, 'en'));
}

/** What waits for QA's decision at one of the actor's sites, the clock that runs out first on top. */
export async function listQueue(ctx: Context, siteId: string, query: QueueQuery): Promise<QueueView> {
	authorize(ctx, 'disposition.sign');
	const site = await getOwnSite(ctx, siteId);
	const waiting = await findWaiting(site.id);
	const facts = await findBoardFacts(waiting);
	const rows = await queueRows(ctx, waiting, facts);
	const wanted = rows.filter((row, i) => {
		const shipment = waiting[i];
		return shipment !== undefined && isWanted(ctx, row, shipment, facts, query);
	});
	return {
		rows: inOrder(wanted, query.sort),
		counts: {
			ready: rows.filter((row) => row.next.isMine).length,
			all: rows.length,
			mine: rows.filter((row) => row.takenBy?.id === ctx.actor.id).length,
			nobody: rows.filter((row) => row.takenBy === null).length
		},
		products: named([...facts.products].map(([id, { name }]) => [id, name] as const)),
		suppliers: named(
			waiting.map((row) => [row.supplierId, facts.partners.get(row.supplierId) ?? ''] as const)
		)
	};
}

/** The docket that waits next for this person: their own or nobody's, ready, by its clock; null when none does. */
export async function findNextWaiting(
	ctx: Context,
	siteId: string,
	exceptNumber: string
): Promise<{ number: string; title: string } | null> {
	const query = {
		sort: 'clock',
		taken: 'any',
		show: 'ready',
		product: null,
		supplier: null,
		q: null
	} as const;
	const { rows } = await listQueue(ctx, siteId, query);
	const next = rows.find(
		(row) => row.number !== exceptNumber && (row.takenBy === null || row.takenBy.id === ctx.actor.id)
	);
	return next ? { number: next.number, title: `${next.supplier}, ${next.goods.product}` } : null;
}
