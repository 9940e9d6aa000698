import { describe, expect, it } from 'vitest';
import { fitModels } from '../domain/shelf-life/fit-models';
import { rateAt } from '../domain/shelf-life/rate-curve';
import { readSpecForm } from './spec-form';
import { fitReference, fittedValues } from './spec-form-fit';

/** UC Davis Postharvest Center, produce fact sheet, broccoli: 21 to 28 d at 0 °C, 14 at 5 °C, 5 at 10 °C. */
const points = [
	{ celsius: 10, lifeHours: 120 },
	{ celsius: 0, lifeHours: 504 },
	{ celsius: 0, lifeHours: 672 },
	{ celsius: 5, lifeHours: 336 }
];

describe('a fitted model', () => {
	for (const unit of ['celsius', 'fahrenheit'] as const)
		for (const reference of [0, 5])
			it.each(fitModels(points, reference).filter((fit) => 'model' in fit))(
				`$kind at ${reference} °C in ${unit} fills the editor with the same curve`,
				(fit) => {
					const values = {
						unit,
						needed: '1',
						openingDefault: '0',
						...fittedValues(fit, points, reference, unit)
					};
					const { spec, faults } = readSpecForm(values);
					expect(faults).toEqual([]);
					if (!spec) return expect.unreachable();
					expect([spec.model.kind, spec.validFromCelsius, spec.validToCelsius]).toEqual([fit.kind, 0, 10]);
					// The fields hold six decimals: a life may be off by a few millionths.
					for (const { celsius, fittedHours } of fit.residuals)
						expect(spec.fullLifeHours / rateAt(spec, celsius) / fittedHours).toBeCloseTo(1, 4);
				}
			);

	it('is referred to what is entered where the table reaches it, else to its coldest', () => {
		expect(fitReference(points, 5)).toBe(5);
		expect(fitReference(points, 20)).toBe(0);
		expect(fitReference(points, null)).toBe(0);
	});
});
