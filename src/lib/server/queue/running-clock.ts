import type { BoardLife } from '../../schemas/board';
import type { QueueClock } from '../../schemas/queue';

const msPerHour = 3_600_000;

interface OpenClock {
	name: string;
	basis: string;
	noticeId: string | null;
	startsAt: Date;
	deadlineAt: Date;
}

interface OpenHold {
	putAt: Date;
	untilAt: Date | null;
	awaited: string | null;
}

/** Until when goods are held for what is awaited. */
function holdClock({ putAt, untilAt, awaited }: OpenHold): QueueClock[] {
	if (untilAt === null) return [];
	return [
		{
			kind: 'hold',
			startsAt: putAt.toISOString(),
			deadlineAt: untilAt.toISOString(),
			basis: awaited ? `awaits ${awaited}` : 'held'
		}
	];
}

/** When the low falls under what is needed, if the goods stay at the spec's own temperature from the door on. */
function lifeClock(life: BoardLife | null, arrivedAt: Date | null): QueueClock | null {
	if (life === null || arrivedAt === null || life.lowHours < life.neededHours) return null;
	const deadlineMs = arrivedAt.getTime() + (life.lowHours - life.neededHours) * msPerHour;
	return {
		kind: 'life',
		startsAt: arrivedAt.toISOString(),
		deadlineAt: new Date(deadlineMs).toISOString(),
		basis: 'the low falls under the need, kept at the spec’s temperature'
	};
}

/** The clock of a docket that runs out first; null where none runs. */
export function runningClock(
	open: readonly OpenClock[],
	life: BoardLife | null,
	arrivedAt: Date | null,
	holds: readonly OpenHold[] = []
): QueueClock | null {
	const running = open.map(({ basis, noticeId, startsAt, deadlineAt }): QueueClock => ({
		kind: noticeId === null ? 'reject' : 'notice',
		startsAt: startsAt.toISOString(),
		deadlineAt: deadlineAt.toISOString(),
		basis
	}));
	const ofLife = lifeClock(life, arrivedAt);
	return [...running, ...(ofLife ? [ofLife] : []), ...holds.flatMap(holdClock)].reduce<QueueClock | null>(
		(first, clock) => (first === null || clock.deadlineAt < first.deadlineAt ? clock : first),
		null
	);
}
