import { DateTime } from 'luxon';
import { msPerMinute } from '../../domain/units';
import { NumberSeries } from '../db/models/number-series';
import { Setting } from '../db/models/setting';
import { enterLoggers, loggers } from './cast/loggers';
import { enterLanes } from './cast/enter-lanes';
import { enterPartners } from './cast/enter-partners';
import { enterProducts } from './cast/enter-products';
import { openSites } from './cast/open-sites';
import { admin } from './cast/people';
import { sites, type SiteKey } from './cast/sites';
import { ahead } from './loads/ahead';
import { pastOrdinary } from './loads/past-ordinary';
import { pastRefused } from './loads/past-refused';
import { pastStories } from './loads/past-stories';
import { todayMill } from './loads/today-mill';
import { todayStaithe } from './loads/today-staithe';
import { playLoad } from './play/play-load';
import { stage, withLots, type Staged } from './play/staged';
import { contextOf, type World } from './play/world';

const loadedAt = 'demo-loaded-at';
/** The house was founded this long before the first load. */
const foundedDaysBefore = 70;
/** At the latest: the exports to try were written in spring 2026, and specs must be in force when they are read. */
const foundedByMs = Date.UTC(2026, 0, 5, 8);

/** What a caller may be told while it works. */
export type Say = (line: string) => void;

/** When the demo was loaded into this database; null: it was not. */
export async function demoLoadedAt(): Promise<string | null> {
	return (await Setting.findByPk(loadedAt))?.value ?? null;
}

async function enterCast(anchor: Date): Promise<World> {
	const before = DateTime.fromJSDate(anchor, { zone: 'utc' }).minus({ days: foundedDaysBefore }).toMillis();
	const founded = Math.min(before, foundedByMs);
	const staff = await openSites(new Date(founded));
	const half = {
		...staff,
		anchor,
		partnerIds: new Map<string, string>(),
		productIds: new Map<string, string>()
	};
	const ctx = contextOf(half, admin.key, founded + 20 * msPerMinute);
	const partnerIds = await enterPartners(ctx);
	await staff.addOutsiders(partnerIds);
	await enterLoggers(ctx, anchor);
	await enterLanes(ctx, staff.siteIds, partnerIds);
	return { ...half, partnerIds, productIds: await enterProducts(ctx) };
}

/** Numbers go on from what the house had before, so that the first docket is not the first of its life. */
const numbersBefore = {
	PS: { docket: 1127, notice: 205, claim: 41 },
	HM: { docket: 412, notice: 88, claim: 16 }
} as const;
/** The docket that waits at QA today has this number, whatever came before it, unless the year is too young. */
const numberAtQa = 1184;

function yearOf(ms: number, site: SiteKey): number {
	return DateTime.fromMillis(ms, { zone: sites[site].zone }).year;
}

function lastDocketBefore(staged: readonly Staged[], site: SiteKey): number {
	const own = staged.filter(({ lane }) => lane.site === site);
	const at = own.findIndex(({ plan }) => plan === todayStaithe[0]);
	const isOneYear = at >= 0 && yearOf(own[0]?.advisedMs ?? 0, site) === yearOf(own[at]?.advisedMs ?? 0, site);
	return isOneYear ? numberAtQa - 1 - at : numbersBefore[site].docket;
}

async function startNumbers(world: World, staged: readonly Staged[]): Promise<void> {
	for (const site of ['PS', 'HM'] as const) {
		const [siteId, year] = [world.siteIds[site], yearOf(staged[0]?.advisedMs ?? 0, site)];
		const last = { ...numbersBefore[site], docket: lastDocketBefore(staged, site) };
		for (const kind of ['docket', 'notice', 'claim'] as const)
			await NumberSeries.create({ siteId, year, kind, last: last[kind] });
	}
}

/** The instruments go round: each load takes the next ones, in the order of its docket. */
function withSerials(staged: readonly Staged[]): { load: Staged; serials: string[] }[] {
	let next = 0;
	return staged.map((load) => ({
		load,
		serials: load.rides.map(() => loggers[next++ % loggers.length]?.serial ?? '')
	}));
}

/**
 * Loads the demo: everything invented, the same for the same anchor, and done by the use cases themselves at the
 * moments of their past. Jobs stay in the queue for the worker. Once only: a second call does nothing.
 * @returns how many dockets were opened; null where it was loaded before
 */
export async function loadDemo(anchor = new Date(), say: Say = () => {}): Promise<number | null> {
	if (await demoLoadedAt()) return null;
	const moment = new Date(Math.floor(anchor.getTime() / msPerMinute) * msPerMinute);
	const world = await enterCast(moment);
	say('Sites, people, partners, products and loggers are there.');

	const plans = [...pastStories, ...pastRefused, ...pastOrdinary, ...todayStaithe, ...todayMill, ...ahead];
	const inOrder = plans.map((plan) => stage(plan, moment)).sort((a, b) => a.advisedMs - b.advisedMs);
	const staged = withLots(inOrder);
	await startNumbers(world, staged);
	const steps = withSerials(staged)
		.flatMap(({ load, serials }) => playLoad(world, load, serials))
		.sort((a, b) => a.atMs - b.atMs);
	for (const [done, { act }] of steps.entries()) {
		await act();
		if ((done + 1) % 100 === 0) say(`${done + 1} of ${steps.length} things done.`);
	}
	await Setting.create({ name: loadedAt, value: anchor.toISOString() });
	say(`${staged.length} dockets are open.`);
	return staged.length;
}
