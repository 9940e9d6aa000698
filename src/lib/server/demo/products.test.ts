import { describe, expect, it } from 'vitest';
import { q10FromTwoLives, q10FromTwoRates } from '../../domain/shelf-life/rate-q10';
import { rateAt } from '../../domain/shelf-life/rate-curve';
import { activationEnergyFromLives } from '../../domain/shelf-life/rate-arrhenius';
import { validateSpec } from '../../domain/shelf-life/validate';
import type { Spec } from '../../domain/shelf-life/spec';
import { specSchema } from '../../schemas/spec';
import { demoProducts } from './products';

function specOf(name: string): Spec {
	const found = demoProducts.find((product) => product.name.startsWith(name));
	if (!found) throw new Error(`No product ${name}.`);
	return found.spec;
}
const lifeDaysAt = (spec: Spec, celsius: number) => spec.fullLifeHours / rateAt(spec, celsius) / 24;

describe('the demo catalogue', () => {
	it('holds specs that can be assessed with, stored and read back unchanged', () => {
		for (const { name, spec } of demoProducts) {
			expect([name, validateSpec(spec)]).toEqual([name, []]);
			expect(specSchema.parse(JSON.parse(JSON.stringify(spec)))).toEqual(spec);
		}
	});

	it('shows a source, a caution and a need within the pessimist’s life for every product', () => {
		for (const { name, spec, reason } of demoProducts) {
			expect([name, spec.sources.length > 0, spec.caution !== null, reason !== '']).toEqual([
				name,
				true,
				true,
				true
			]);
			const pessimist = spec.fullLifeHours - spec.fullLifeUncertaintyHours - spec.openingDefaultHours;
			expect([name, pessimist >= spec.neededHours]).toEqual([name, true]);
		}
	});

	it('uses every model', () => {
		expect(new Set(demoProducts.map(({ spec }) => spec.model.kind)).size).toBe(6);
	});

	it('says "common practice, no source" where no published life stands behind the figure', () => {
		for (const name of ['Tulips', 'Milk']) {
			expect(specOf(name).sources[0]?.text).toContain('common practice, no source');
		}
	});

	// UC Davis Postharvest Center, produce fact sheet, broccoli: 28, 14 and 5 d at 0, 5 and 10 °C.
	it('gives broccoli the published lives and the log-linear ones between', () => {
		const spec = specOf('Broccoli');
		expect(lifeDaysAt(spec, 0)).toBe(28);
		// The exponent and its inverse cost a last digit each.
		expect(lifeDaysAt(spec, 5)).toBeCloseTo(14, 12);
		expect(lifeDaysAt(spec, 10)).toBeCloseTo(5, 12);
		expect(lifeDaysAt(spec, 2.5)).toBeCloseTo(19.799, 3);
		expect(lifeDaysAt(spec, 7.5)).toBeCloseTo(8.3666, 4);
	});

	// UC Davis Postharvest Center, produce fact sheet, crisphead lettuce: 28 and 14 d at 0 and 5 °C.
	it('gives lettuce a Q10 of 4 between its two published lives', () => {
		const { model } = specOf('Lettuce');
		expect(model.kind === 'two-lives' && q10FromTwoLives(model.lower, model.upper)).toBeCloseTo(4, 10);
	});

	// USDA Agriculture Handbook 66, respiration in mg CO₂/(kg·h).
	it('takes the Q10 of berries, grapes and asparagus from published respiration', () => {
		const blueberry = specOf('Blueberries');
		expect(rateAt(blueberry, 10)).toBeCloseTo(q10FromTwoRates(0, 6, 10, 29), 2);
		expect(rateAt(blueberry, 20)).toBeCloseTo(70 / 6, 1);
		expect(rateAt(specOf('Strawberries'), 20)).toBeCloseTo(150 / 16, 1);
		expect(rateAt(specOf('Table grapes'), 20)).toBeCloseTo(27 / 3, 10);
		expect(rateAt(specOf('Asparagus'), 10) / rateAt(specOf('Asparagus'), 2)).toBeCloseTo(
			(215 / 60) ** 0.8,
			2
		);
	});

	// FAO Fisheries Technical Paper 348 (Huss 1995), 6.1: 14 d in ice give 6.22 d at 5 °C and 3.5 d at 10 °C.
	it('ages cod by the square root with Tmin −10 °C', () => {
		expect(lifeDaysAt(specOf('Cod'), 5)).toBeCloseTo(14 / 2.25, 10);
		expect(lifeDaysAt(specOf('Cod'), 10)).toBeCloseTo(3.5, 10);
	});

	// Dalgaard, Murillo and Jørgensen 2004: relative rates e^(0.089·T), 1.561 at 5 °C, 3.800 at 15 °C.
	it('ages cold-smoked salmon by the published exponential', () => {
		expect(rateAt(specOf('Salmon, cold-smoked'), 15)).toBeCloseTo(3.8 / 1.561, 2);
	});

	// WHO specification E6/IN5, category of 7 days: 45 d at 25 °C, 7 d at 37 °C.
	it('gives the vaccine the activation energy of its monitor category', () => {
		const energy = activationEnergyFromLives({ celsius: 25, lifeHours: 45 }, { celsius: 37, lifeHours: 7 });
		const { model } = specOf('Vaccine');
		expect(model.kind === 'arrhenius' && model.activationEnergyKilojoulesPerMole).toBeCloseTo(energy, 1);
	});

	it('does not credit tomatoes for cold under their chilling threshold', () => {
		const spec = specOf('Tomatoes');
		expect(rateAt(spec, 4)).toBe(rateAt(spec, 10));
	});
});
