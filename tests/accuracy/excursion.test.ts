import { describe, expect, it } from 'vitest';
import { assess } from '../../src/lib/domain/receiving/assess';
import { buildInput, buildLimit, buildSpec, buildTrace, minuteMs, startMs } from './build';

// Ten-minute readings over 5.0 °C, crossings on straight lines.
// Source: plane geometry of the polyline; four triangles and trapezia of 1, 8, 10 and 4 °C·min.
const readings = [4.0, 4.6, 5.4, 6.2, 5.8, 5.0, 4.4];

function excursionsOver(celsius: number) {
	return assess(buildInput(buildTrace(readings), buildSpec({ upper: buildLimit(celsius) }))).excursions;
}

describe('an excursion over 5.0 °C', () => {
	it('is one, from 15 to 50 min, of 35 min and 23.0 °C·min, at most 6.2 °C', () => {
		const [excursion, ...others] = excursionsOver(5);
		expect(others).toEqual([]);
		expect(excursion?.kind).toBe('too-warm');
		expect((excursion?.fromMs ?? NaN) - startMs).toBeCloseTo(15 * minuteMs, 3);
		expect((excursion?.toMs ?? NaN) - startMs).toBeCloseTo(50 * minuteMs, 3);
		expect(excursion?.minutes).toBeCloseTo(35, 6);
		expect(excursion?.degreeMinutes).toBeCloseTo(23, 6);
		expect(excursion?.meanCelsius).toBeCloseTo(5 + 23 / 35, 6);
		expect(excursion?.extremeCelsius).toBe(6.2);
		expect(excursion?.extremeAtMs).toBe(startMs + 30 * minuteMs);
	});

	it('lasts 22.5 min with 8.625 °C·min against 5.5 °C', () => {
		const [excursion] = excursionsOver(5.5);
		expect(excursion?.minutes).toBeCloseTo(22.5, 6);
		expect(excursion?.degreeMinutes).toBeCloseTo(8.625, 6);
	});

	it('is none against its own peak', () => {
		expect(excursionsOver(6.2)).toEqual([]);
	});
});
