import { q10FromTwoLives } from '../../domain/shelf-life/rate-q10';
import type { RateModel } from '../../domain/shelf-life/spec';
import type { TemperatureUnit } from '../../domain/units';
import { count, decimal, temperature, temperatureSign } from '../../format';

/** The figure a model stands on, for a ledger: `5.60`, `3 points`, `Tmin −10.0 °C`. */
export function modelFigure(model: RateModel, unit: TemperatureUnit, locale: string): string {
	switch (model.kind) {
		case 'constant-q10':
			return `Q10 ${decimal(model.q10, 2, locale)}`;
		case 'two-lives':
			return `Q10 ${decimal(q10FromTwoLives(model.lower, model.upper), 2, locale)}`;
		case 'banded-q10':
			return model.bands.map((band) => decimal(band.q10, 2, locale)).join(', ');
		case 'arrhenius':
			return `Ea ${decimal(model.activationEnergyKilojoulesPerMole, 1, locale)}`;
		case 'life-table':
			return `${count(model.points.length, locale)} points`;
		case 'square-root':
			return `Tmin ${temperature(model.minCelsius, unit, locale)} ${temperatureSign(unit)}`;
	}
}
