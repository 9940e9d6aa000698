import { describe, expect, it } from 'vitest';
import { buildLimit, buildSpec, buildTrace, minuteMs, startMs } from '../../../../tests/accuracy/build';
import { courseOf, type Stretch } from '../shelf-life/course';
import { lifeUsed } from '../shelf-life/life-used';
import { rateCurve } from '../shelf-life/rate-curve';
import type { Limit, Spec } from '../shelf-life/spec';
import type { Placement } from '../trace/trace';
import { findExcursions } from './find-excursions';

interface Setting {
	readonly upper?: Limit;
	readonly lower?: Limit;
	readonly accuracyCelsius?: number;
	readonly placement?: Placement;
	readonly trims?: readonly Stretch[];
	readonly everyMinutes?: number;
	readonly model?: Spec['model'];
}

function found(celsius: readonly number[], setting: Setting) {
	const { upper = null, lower = null, accuracyCelsius = 0, placement = 'in-product' } = setting;
	const spec = buildSpec({ upper, lower, ...(setting.model ? { model: setting.model } : {}) });
	const course = courseOf(buildTrace(celsius, setting.everyMinutes ?? 10), null, setting.trims ?? []);
	const curve = rateCurve(spec);
	const used = lifeUsed(course, curve, 0, 'value');
	return findExcursions({ spec, course, curve, used, accuracyCelsius, placement });
}
const at = (minutes: number) => startMs + minutes * minuteMs;
const minutes = (events: ReturnType<typeof found>) =>
	events.map((event) => Math.round(event.minutes * 1e6) / 1e6);

describe('grace', () => {
	// 10 min and then 30 min above 5 °C: two triangles' feet.
	const log = [4, 6, 4, 4, 6, 6, 6, 4, 4];

	it('lets pass an event that is no longer', () => {
		expect(minutes(found(log, { upper: buildLimit(5, { graceMinutesInAll: 999 }) }))).toEqual([10, 30]);
		expect(
			minutes(found(log, { upper: buildLimit(5, { graceMinutes: 10, graceMinutesInAll: 999 }) }))
		).toEqual([30]);
		expect(
			minutes(found(log, { upper: buildLimit(5, { graceMinutes: 30, graceMinutesInAll: 999 }) }))
		).toEqual([]);
	});

	it('is spent when all events together are longer than the cumulative one', () => {
		expect(
			minutes(found(log, { upper: buildLimit(5, { graceMinutes: 30, graceMinutesInAll: 40 }) }))
		).toEqual([]);
		expect(
			minutes(found(log, { upper: buildLimit(5, { graceMinutes: 30, graceMinutesInAll: 39 }) }))
		).toEqual([10, 30]);
	});

	it('of air applies to air alone', () => {
		const upper = buildLimit(5, { graceMinutesInAll: 99, airGraceMinutes: 20, airGraceMinutesInAll: 99 });
		expect(minutes(found(log, { upper, placement: 'air' }))).toEqual([30]);
		expect(minutes(found(log, { upper, placement: 'between-cases' }))).toEqual([10, 30]);
	});
});

describe('hysteresis', () => {
	const log = [4, 6, 4.8, 6, 4, 4];

	it('makes one event of two that did not come back far enough', () => {
		const [event, ...others] = found(log, { upper: buildLimit(5, { hysteresisCelsius: 0.5 }) });
		expect(others).toEqual([]);
		// Minutes are time above the limit: the dip between is not in them.
		const above = 5 + (10 * 1) / 1.2 + (10 * 1) / 1.2 + 5;
		expect(event?.minutes).toBeCloseTo(above, 6);
		expect((event?.toMs ?? NaN) - (event?.fromMs ?? NaN)).toBeCloseTo(30 * minuteMs, 3);
	});

	it('of none leaves two', () => {
		expect(found(log, { upper: buildLimit(5) })).toHaveLength(2);
	});

	it('is reached at exactly its width', () => {
		expect(found([4, 6, 4.5, 6, 4], { upper: buildLimit(5, { hysteresisCelsius: 0.5 }) })).toHaveLength(2);
	});
});

describe('severity', () => {
	const limit = buildLimit(5, { majorMinutes: 20, criticalMinutes: 30 });

	it.each([
		[[4, 6, 4], 'minor'],
		[[4, 6, 6, 4], 'major'],
		[[4, 6, 6, 6, 4], 'critical']
	] as const)('of %o is %s', (log, severity) => {
		expect(found(log, { upper: limit })[0]?.severity).toBe(severity);
	});
});

describe('what an event cost', () => {
	it('is life used beyond it less what the limit would have used', () => {
		// An hour at 10 °C (rate 3) against an hour at 5 °C (√3), the flanks apart.
		const log = [5, 10, 10, 5];
		const [event] = found(log, { upper: buildLimit(5), everyMinutes: 60 });
		const flank = (3 - Math.sqrt(3)) / (Math.log(3) / 2);
		expect(event?.costHours).toBeCloseTo(3 + 2 * flank - 3 * Math.sqrt(3), 10);
	});

	it('is none of cold, which saves rather than costs', () => {
		const [event] = found([1, -2, -2, 1], { lower: buildLimit(0) });
		expect(event?.kind).toBe('too-cold');
		expect(event?.costHours).toBe(0);
		expect(event?.extremeCelsius).toBe(-2);
		expect(event?.meanCelsius).toBeLessThan(0);
		expect(event?.degreeMinutes).toBeGreaterThan(0);
	});

	it('is none where the rate is held', () => {
		const spec = {
			kind: 'life-table',
			points: [
				{ celsius: 0, lifeHours: 10 },
				{ celsius: 5, lifeHours: 5 }
			]
		} as const;
		expect(found([4, 9, 9, 4], { upper: buildLimit(6), model: spec })[0]?.costHours).toBeCloseTo(0, 12);
	});
});

describe('an event', () => {
	it('begins at the first reading where that is beyond already', () => {
		const [event] = found([6, 6, 4], { upper: buildLimit(5) });
		expect(event?.fromMs).toBe(startMs);
		expect(event?.minutes).toBeCloseTo(15, 6);
	});

	it('is open where the readings end within it', () => {
		expect(found([4, 6, 6], { upper: buildLimit(5) })[0]?.isOpen).toBe(true);
		expect(found([4, 6, 4], { upper: buildLimit(5) })[0]?.isOpen).toBe(false);
		expect(found([4, 6, 4.8], { upper: buildLimit(5, { hysteresisCelsius: 1 }) })[0]?.isOpen).toBe(true);
	});

	it('is in doubt where the accuracy straddles the limit throughout', () => {
		expect(found([4, 5.4, 4], { upper: buildLimit(5), accuracyCelsius: 0.5 })[0]?.isInDoubt).toBe(true);
		expect(found([4, 5.6, 4], { upper: buildLimit(5), accuracyCelsius: 0.5 })[0]?.isInDoubt).toBe(false);
		expect(found([1, -0.4, 1], { lower: buildLimit(0), accuracyCelsius: 0.5 })[0]?.isInDoubt).toBe(true);
		expect(found([4, 5.1, 4], { upper: buildLimit(5) })[0]?.isInDoubt).toBe(false);
	});

	it('does not run across a trim', () => {
		const events = found([4, 6, 6, 6, 6, 4], {
			upper: buildLimit(5),
			trims: [{ fromMs: at(22), toMs: at(28) }]
		});
		expect(minutes(events)).toEqual([15, 15]);
		expect(events.map((event) => event.isOpen)).toEqual([false, false]);
	});

	it('stands in order of time among those of the other side', () => {
		const events = found([1, -2, 1, 8, 1, -2, 1], { upper: buildLimit(5), lower: buildLimit(0) });
		expect(events.map((event) => event.kind)).toEqual(['too-cold', 'too-warm', 'too-cold']);
	});

	it('is none at the limit itself', () => {
		expect(found([5, 5, 5], { upper: buildLimit(5), lower: buildLimit(5.0) })).toEqual([]);
	});
});
