import { describe, expect, it } from 'vitest';
import { ahead } from '../loads/ahead';
import { pastOrdinary } from '../loads/past-ordinary';
import { pastRefused } from '../loads/past-refused';
import { pastStories } from '../loads/past-stories';
import { todayMill } from '../loads/today-mill';
import { todayStaithe } from '../loads/today-staithe';
import { lotOf, stage, withLots } from './staged';
import { exportOfRide } from './upload';

const plans = [...pastStories, ...pastRefused, ...pastOrdinary, ...todayStaithe, ...todayMill, ...ahead];
const anchor = new Date('2026-05-12T09:35:00Z');
const staged = (at: Date) => withLots(plans.map((plan) => stage(plan, at)));

describe('the loads of the demo', () => {
	it('have keys of their own: each load’s chance hangs on it', () => {
		expect(new Set(plans.map(({ key }) => key)).size).toBe(plans.length);
	});

	it('are the same for the same anchor', () => {
		expect(staged(anchor).map(({ arrivedMs, goods }) => [arrivedMs, goods])).toEqual(
			staged(anchor).map(({ arrivedMs, goods }) => [arrivedMs, goods])
		);
	});

	it('have the same readings a week later, seven days on', () => {
		const week = 7 * 24 * 3_600_000;
		const later = staged(new Date(anchor.getTime() + week));
		for (const [at, load] of staged(anchor).entries()) {
			const other = later[at];
			const ride = load.rides[0];
			if (!other || !ride || load.plan.isExpected) continue;
			const figures = (text: string) =>
				text
					.split('\r\n')
					.slice(4)
					.map((row) => row.split(';')[1]);
			const [first, second] = [load, other].map((one) => exportOfRide(one, ride, 'SB-1', 'iso').text);
			expect(figures(second ?? '')).toEqual(figures(first ?? ''));
		}
	});

	it('are all opened before now, and done only once they are here', () => {
		for (const load of staged(anchor)) {
			expect(load.advisedMs).toBeLessThan(anchor.getTime());
			expect(load.legs[0]?.actualMs).toBeLessThan(load.dueMs);
			if (load.plan.isExpected) continue;
			expect([load.plan.key, load.arrivedMs > load.advisedMs]).toEqual([load.plan.key, true]);
			const minutes = (load.plan.decided?.afterMinutes ?? 3) * load.pace;
			expect(load.arrivedMs + minutes * 60_000).toBeLessThan(anchor.getTime());
		}
	});

	it.each(['02:00', '03:10', '09:35', '16:20', '23:50'])('stand in order when now is %s', (clock) => {
		const now = new Date(`2026-05-12T${clock}:00Z`);
		for (const load of staged(now)) {
			const isHere = !load.plan.isExpected;
			expect([load.plan.key, load.arrivedMs <= now.getTime()]).toEqual([load.plan.key, isHere]);
		}
	});

	it('never share a lot', () => {
		const lots = staged(anchor).flatMap((load) => load.goods.map((_, at) => lotOf(load, at + 1)));
		expect(new Set(lots).size).toBe(lots.length);
	});
});
