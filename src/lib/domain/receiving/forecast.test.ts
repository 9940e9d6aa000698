import { describe, expect, it } from 'vitest';
import { buildSpec, dayHours, hourMs, startMs } from '../../../../tests/accuracy/build';
import { forecastAt } from './forecast';

const cod = buildSpec({ model: { kind: 'square-root', minCelsius: -10 } });
const remaining = { value: 7.36 * dayHours, low: 7 * dayHours, high: 8 * dayHours };

describe('life ends about', () => {
	it('after 7.36 d in ice, 5.111 d at 2 °C, 3.755 d at 4 °C', () => {
		// Source: FAO Fisheries Technical Paper 348 6.1, rate (1 + 0.1 T)²: 7.36 ÷ 1.44 and ÷ 1.96.
		for (const [celsius, days] of [
			[0, 7.36],
			[2, 5.111],
			[4, 3.755]
		] as const) {
			const forecast = forecastAt(cod, remaining, startMs, celsius);
			expect((forecast?.lastsHours.value ?? NaN) / dayHours).toBeCloseTo(days, 3);
			expect(forecast?.endsMs.value).toBe(Math.round(startMs + (forecast?.lastsHours.value ?? NaN) * hourMs));
		}
	});

	it('has the range of what is left', () => {
		expect(forecastAt(cod, remaining, startMs, 0)?.lastsHours).toEqual(remaining);
	});

	it('is wider where the onward temperature is uncertain', () => {
		const forecast = forecastAt(cod, remaining, startMs, 2, 2);
		expect(forecast?.lastsHours.low).toBeCloseTo(remaining.low / 1.96, 9);
		expect(forecast?.lastsHours.high).toBeCloseTo(remaining.high / 1, 9);
	});

	it('is not named where life stands still', () => {
		expect(forecastAt(cod, remaining, startMs, -12)).toBeNull();
		expect(forecastAt(cod, remaining, startMs, -9, 2)).toBeNull();
	});

	it('says that it is over, its low still the lower', () => {
		const over = forecastAt(cod, { value: -10, low: -20, high: -1 }, startMs, 4, 2);
		expect(over?.isOver).toBe(true);
		expect(over?.lastsHours.low).toBeLessThan(over?.lastsHours.value ?? NaN);
		expect(over?.lastsHours.high).toBeGreaterThan(over?.lastsHours.value ?? NaN);
		expect(over?.endsMs.value).toBeLessThan(startMs);
		expect(forecastAt(cod, remaining, startMs, 4)?.isOver).toBe(false);
	});
});
