import { msPerMinute } from '../../../domain/units';
import { logArrival } from '../../arrivals/log-arrival';
import { ShipmentLine } from '../../db/models/shipment-line';
import { TraceRow } from '../../db/models/trace-row';
import { putHold } from '../../holds/put-hold';
import { addNote } from '../../notes/add-note';
import { addPhoto } from '../../photos/add-photo';
import { cancelShipment } from '../../shipments/cancel-shipment';
import { createShipment } from '../../shipments/create-shipment';
import { makeTrim } from '../../traces/trims';
import { aftermathSteps, type Opened } from './aftermath';
import { arrivalOf } from './at-the-door';
import { decide } from './decide';
import { papersOf } from './papers';
import { pictures } from './pictures';
import type { Staged } from './staged';
import { writeStore } from './write-store';
import { exportOfRide, keep, upload } from './upload';
import { contextOf, type Step, type World } from './world';

const minutesToLog = 3;
const firstReadAfter = 9;

interface Play {
	world: World;
	staged: Staged;
	serials: readonly string[];
	docket: () => Opened;
	/** So many minutes after the arrival, at the load's pace. */
	after: (minutes: number) => number;
}

async function lineIdsOf(docket: Opened): Promise<string[]> {
	const lines = await ShipmentLine.findAll({ where: { shipmentId: docket.id }, order: ['ordinal'] });
	return lines.map(({ id }) => id);
}

function arrivalStep({ world, staged, docket, after }: Play): Step {
	const atMs = after(minutesToLog);
	const act = async () => {
		const seen = arrivalOf(staged, await lineIdsOf(docket()));
		await logArrival(contextOf(world, 'dock', atMs), docket().number, seen);
	};
	return { atMs, act };
}

function readSteps({ world, staged, serials, docket, after }: Play): Step[] {
	const { plan, rides } = staged;
	const kept = rides.slice(0, plan.reads ?? rides.length).map((ride, at) => {
		const atMs = after((plan.readAfterMinutes ?? firstReadAfter) + at * 3);
		const act = async () => {
			const serial = serials[at] ?? '';
			const file = exportOfRide(staged, ride, serial, ride.layout);
			const readId = await upload(contextOf(world, 'dock', atMs), docket().number, file);
			const lineId = ride.line === null ? null : ((await lineIdsOf(docket()))[ride.line - 1] ?? null);
			await keep(contextOf(world, 'dock', atMs + msPerMinute), readId, ride, serial, lineId);
		};
		return { atMs, act };
	});
	const asking = plan.question && rides[kept.length];
	if (!asking) return kept;
	const atMs = after(minutesToLog + 0.5);
	const file = () => exportOfRide(staged, asking, serials[kept.length] ?? '', plan.question ?? asking.layout);
	const act = async () => void (await upload(contextOf(world, 'dock', atMs), docket().number, file()));
	return [...kept, { atMs, act }];
}

/** Custody is written on from the dock to the store. */
function storeSteps({ world, staged, serials, docket, after }: Play): Step[] {
	const { intoStore } = staged.plan;
	if (!intoStore) return [];
	const atMs = after(intoStore.minutes + 2);
	const act = () =>
		writeStore(contextOf(world, 'dock', atMs), docket(), papersOf(world, staged, serials), staged);
	return [{ atMs, act }];
}

/** The first minutes of a trace are somebody's hand, not the load. */
async function trimStarts({ world, docket }: Play, minutes: number, atMs: number): Promise<void> {
	for (const trace of await TraceRow.findAll({ where: { shipmentId: docket().id, isAssessed: true } }))
		await makeTrim(contextOf(world, 'qa', atMs), {
			traceId: trace.id,
			fromAt: trace.firstAt.toISOString(),
			toAt: new Date(trace.firstAt.getTime() + minutes * msPerMinute).toISOString(),
			reason: 'Logger in the hand before it was put in the fruit'
		});
}

function photoSteps({ world, staged, docket, after }: Play): Step[] {
	return (staged.plan.photos ?? []).map(({ shows, kind, afterMinutes, caption }) => {
		const atMs = after(afterMinutes);
		const act = async () =>
			void (await addPhoto(
				contextOf(world, 'dock', atMs),
				docket().number,
				{ id: null, kind, caption },
				pictures[shows]
			));
		return { atMs, act };
	});
}

function wordsSteps({ world, staged, docket, after }: Play): Step[] {
	const { hold, notes = [] } = staged.plan;
	const steps = notes.map(({ by, afterMinutes, text }) => {
		const atMs = after(afterMinutes);
		const act = async () =>
			void (await addNote(contextOf(world, by, atMs), docket().number, { id: null, text }));
		return { atMs, act };
	});
	if (!hold) return steps;
	const atMs = after(hold.afterMinutes);
	const reason = { id: null, reason: hold.reason };
	return [
		...steps,
		{
			atMs,
			act: async () => {
				const input = { awaited: null, until: null, ...reason };
				await putHold(contextOf(world, 'dock', atMs), docket().number, input);
			}
		}
	];
}

function decisionSteps(play: Play): Step[] {
	const { world, staged, docket, after } = play;
	const { decided, trimFirstMinutes } = staged.plan;
	const steps: Step[] = [];
	if (trimFirstMinutes) {
		const atMs = after(138);
		steps.push({ atMs, act: () => trimStarts(play, trimFirstMinutes, atMs) });
	}
	if (!decided) return steps;
	const atMs = after(decided.afterMinutes);
	const act = () => decide(contextOf(world, 'qa', atMs), docket().number, decided);
	return [...steps, { atMs, act }, ...aftermathSteps(world, staged, docket, atMs)];
}

/** Everything that is done with one load, each step at its own moment. */
export function playLoad(world: World, staged: Staged, serials: readonly string[]): Step[] {
	const { plan, lane, arrivedMs, advisedMs, pace } = staged;
	let opened: Opened | null = null;
	const docket = () => {
		if (!opened) throw new Error(`The docket of ${plan.key} is not open yet.`);
		return opened;
	};
	const after = (minutes: number) => arrivedMs + Math.round(minutes * pace * msPerMinute);
	const play: Play = { world, staged, serials, docket, after };
	const open = async () => {
		const ctx = contextOf(world, 'dock', advisedMs);
		opened = await createShipment(ctx, world.siteIds[lane.site], papersOf(world, staged, serials), 'seed');
	};
	const steps: Step[] = [{ atMs: advisedMs, act: open }];
	if (plan.cancelled) {
		const atMs = advisedMs + 40 * msPerMinute;
		const reason = plan.cancelled;
		const act = async () =>
			void (await cancelShipment(contextOf(world, 'dock', atMs), docket().number, reason));
		return [...steps, { atMs, act }];
	}
	if (plan.isExpected) return steps;
	return [
		...steps,
		arrivalStep(play),
		...storeSteps(play),
		...readSteps(play),
		...photoSteps(play),
		...wordsSteps(play),
		...decisionSteps(play)
	];
}
