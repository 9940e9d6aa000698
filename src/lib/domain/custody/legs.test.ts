import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	buildHandover,
	buildInput,
	buildLimit,
	buildSpec,
	buildTrace,
	hourMs,
	minuteMs,
	startMs
} from '../../../../tests/accuracy/build';
import { assess } from '../receiving/assess';
import type { Handover } from '../receiving/assessment';
import { custodyWindow, handoverMs, legsOf } from './legs';

const at = (hours: number) => startMs + hours * hourMs;

describe('legs', () => {
	it('lie between neighbours and belong to the earlier one’s holder', () => {
		const legs = legsOf(
			[buildHandover('a', at(0)), buildHandover('b', at(3)), buildHandover('c', at(5))],
			at(5)
		);
		expect(legs.map((leg) => [leg.ordinal, leg.handover.id, leg.fromMs, leg.toMs])).toEqual([
			[1, 'a', at(0), at(3)],
			[2, 'b', at(3), at(5)]
		]);
	});

	it('follow the instants, not the order they were written in', () => {
		const legs = legsOf(
			[buildHandover('c', at(5)), buildHandover('a', at(0)), buildHandover('b', at(3))],
			at(5)
		);
		expect(legs.map((leg) => leg.handover.id)).toEqual(['a', 'b']);
	});

	it('take the plan where nothing else is known, and leave out what nobody knows', () => {
		const planned = buildHandover('b', null, { plannedMs: at(2) });
		const unknown = buildHandover('x', null);
		expect(handoverMs(unknown)).toBeNull();
		const legs = legsOf([buildHandover('a', at(0)), planned, unknown, buildHandover('c', at(5))], at(5));
		expect(legs.map((leg) => leg.toMs)).toEqual([at(2), at(5)]);
	});

	it('have a planned time only where both ends were planned', () => {
		const planned = (id: string, hours: number) => buildHandover(id, at(hours), { plannedMs: at(hours + 1) });
		const [first, second] = legsOf([planned('a', 0), planned('b', 3), buildHandover('c', at(5))], at(5));
		expect(first?.plannedMs).toBe(3 * hourMs);
		expect(second?.plannedMs).toBeNull();
	});

	it('are none of one handover', () => {
		expect(legsOf([buildHandover('a', at(0))], at(5))).toEqual([]);
		expect(custodyWindow([buildHandover('a', at(0))], at(5))).toBeNull();
		expect(custodyWindow([], at(5))).toBeNull();
	});

	it('do not end by plan while the load is late and its arrival not logged', () => {
		const handovers = [buildHandover('a', at(0)), buildHandover('b', null, { plannedMs: at(4) })];
		expect(custodyWindow(handovers, at(9))).toEqual({ fromMs: at(0), toMs: at(9) });
		expect(custodyWindow(handovers, at(3))).toEqual({ fromMs: at(0), toMs: at(4) });
	});
});

describe('used against allowed', () => {
	/** One leg planned for four hours at 0 °C, that took `tookHours` at `celsius`. */
	function leg(tookHours: number, celsius: number, overrides: Partial<Handover> = {}) {
		const handovers = [
			buildHandover('a', at(0), { plannedMs: at(0), setPointCelsius: 0, ...overrides }),
			buildHandover('b', at(tookHours), { plannedMs: at(4) })
		];
		const trace = buildTrace([celsius, celsius], tookHours * 60);
		const assessment = assess(buildInput(trace, buildSpec(), { handovers }));
		return { ...assessment.legs[0], remaining: assessment.remainingHours.value };
	}

	it('is nothing over where the leg went to plan', () => {
		expect(leg(4, 0)).toMatchObject({
			allowedHours: 4,
			usedHours: 4,
			overHours: 0,
			tooWarmHours: 0,
			tooLateHours: 0
		});
	});

	it('is too late where only time was lost', () => {
		expect(leg(6, 0)).toMatchObject({ overHours: 2, tooWarmHours: 0, tooLateHours: 2 });
	});

	it('is too warm where only the temperature was off', () => {
		expect(leg(4, 10)).toMatchObject({ usedHours: 12, overHours: 8, tooWarmHours: 8, tooLateHours: 0 });
	});

	it('splits where both were: lateness at the set-point, the rest to warmth', () => {
		expect(leg(6, 10)).toMatchObject({ usedHours: 18, overHours: 14, tooWarmHours: 12, tooLateHours: 2 });
	});

	it('sets an early arrival off against warmth', () => {
		expect(leg(3, 10)).toMatchObject({ overHours: 5, tooWarmHours: 6, tooLateHours: -1 });
	});

	it('books a leg colder than agreed as less than nothing too warm', () => {
		const { tooWarmHours, tooLateHours } = leg(5, 0, { setPointCelsius: 10 });
		expect(tooLateHours).toBe(3);
		expect(tooWarmHours).toBe(-10);
	});

	it('holds a given allowance against the time it lasts at the set-point', () => {
		expect(leg(6, 0, { allowedHours: 5 })).toMatchObject({ overHours: 1, tooLateHours: 1, tooWarmHours: 0 });
		expect(leg(6, 10, { allowedHours: 6 })).toMatchObject({
			overHours: 12,
			tooLateHours: 0,
			tooWarmHours: 12
		});
	});

	it('says nothing without an allowance', () => {
		const noPlan = leg(4, 10, { plannedMs: null });
		expect(noPlan).toMatchObject({
			allowedHours: null,
			overHours: null,
			tooWarmHours: null,
			tooLateHours: null
		});
		expect(noPlan).toMatchObject({ butForRemainingHours: null, usedHours: 12, shareOfUsed: 1 });
	});

	it('tells what would be left had the leg used its allowance', () => {
		const warm = leg(4, 10);
		expect(warm.butForRemainingHours).toBe(warm.remaining + 8);
		expect(warm.butForRemainingHours).toBe(14 * 24 - 4);
	});

	it('adds up to the last digit, whatever the figures', () => {
		const hours = fc.double({ min: 0.1, max: 400, noNaN: true });
		const celsius = fc.double({ min: -5, max: 25, noNaN: true });
		fc.assert(
			fc.property(hours, hours, celsius, celsius, (planned, took, kept, set) => {
				const toMs = startMs + Math.ceil(took * hourMs);
				const handovers = [
					buildHandover('a', startMs, { plannedMs: startMs, setPointCelsius: set }),
					buildHandover('b', toMs, { plannedMs: startMs + planned * hourMs })
				];
				const trace = buildTrace([kept, kept], (toMs - startMs) / minuteMs);
				const [use] = assess(buildInput(trace, buildSpec(), { handovers })).legs;
				const { usedHours = NaN, allowedHours, overHours, tooWarmHours, tooLateHours } = use ?? {};
				expect(overHours).toBe(usedHours - (allowedHours ?? NaN));
				expect((tooWarmHours ?? NaN) + (tooLateHours ?? NaN)).toBe(overHours);
			})
		);
	});
});

describe('coverage', () => {
	it('is the part of the leg between readings with no gap', () => {
		const handovers = [buildHandover('a', at(0)), buildHandover('b', at(2)), buildHandover('c', at(4))];
		const trace = buildTrace([0, 0, 0, 0], 60, at(0));
		expect(
			assess(buildInput(trace, buildSpec(), { handovers })).legs.map((leg) => leg.coveredFraction)
		).toEqual([1, 0.5]);
	});

	it('is less by a trim', () => {
		const handovers = [buildHandover('a', at(0)), buildHandover('b', at(3))];
		const trims = [{ fromMs: at(1), toMs: at(2) }];
		const input = buildInput(buildTrace([0, 0, 0, 0], 60), buildSpec(), { handovers, trims });
		expect(assess(input).legs[0]?.coveredFraction).toBe(0);
		expect(assess(input).usedHours.value).toBe(0);
	});
});

describe('an excursion across a handover', () => {
	const upper = buildLimit(5);
	const trace = buildTrace([5, 10, 10, 10, 5], 60);
	const excursionWith = (handovers: readonly Handover[]) =>
		assess(buildInput(trace, buildSpec({ upper }), { handovers })).excursions[0];

	it('names both legs and splits its cost by time', () => {
		const excursion = excursionWith([
			buildHandover('a', at(0)),
			buildHandover('b', at(1)),
			buildHandover('c', at(4))
		]);
		expect(excursion?.legs).toEqual([1, 2]);
		const [first = NaN, second = NaN] = excursion?.legCostHours ?? [];
		expect(second / first).toBeCloseTo(3, 9);
		expect(first + second).toBeCloseTo(excursion?.costHours ?? NaN, 9);
	});

	it('belongs to neither leg where it begins within the error of the handover', () => {
		const doubtful = buildHandover('b', at(1), { plusMinusMinutes: 90 });
		const excursion = excursionWith([buildHandover('a', at(0)), doubtful, buildHandover('c', at(4))]);
		expect(excursion?.legs).toEqual([]);
		expect(excursion?.unsettledHandoverId).toBe('b');
	});

	it('names the legs it ran on into beyond the doubtful one', () => {
		const doubtful = buildHandover('b', at(1), { plusMinusMinutes: 90 });
		const handovers = [
			buildHandover('a', at(0)),
			doubtful,
			buildHandover('c', at(3)),
			buildHandover('d', at(4))
		];
		expect(excursionWith(handovers)?.legs).toEqual([3]);
	});

	it('names none where no leg is known', () => {
		const excursion = excursionWith([]);
		expect(excursion?.legs).toEqual([]);
		expect(excursion?.unsettledHandoverId).toBeUndefined();
	});
});
