import type { LifePoint, Q10Band, RateModel } from './spec';
import { fault, positive, q10, temperature, type SpecFault } from './spec-fault';

/** Faults of the model alone, whatever the rest of the spec says. */
export function modelFaults(faults: SpecFault[], model: RateModel): void {
	switch (model.kind) {
		case 'constant-q10':
			return q10(faults, model.q10, 'model.q10');
		case 'two-lives':
			return pointFaults(faults, [model.lower, model.upper], ['model.lower', 'model.upper']);
		case 'life-table':
			return pointFaults(
				faults,
				model.points,
				model.points.map((_, i) => `model.points.${i}`)
			);
		case 'banded-q10':
			return bandFaults(faults, model.bands);
		case 'arrhenius':
			return positive(
				faults,
				model.activationEnergyKilojoulesPerMole,
				'model.activationEnergyKilojoulesPerMole'
			);
		case 'square-root':
			return temperature(faults, model.minCelsius, 'model.minCelsius');
	}
}

function pointFaults(faults: SpecFault[], points: readonly LifePoint[], fields: readonly string[]): void {
	if (points.length < 2) fault(faults, 'points-too-few', 'model.points');
	points.forEach((point, i) => {
		const before = points[i - 1];
		temperature(faults, point.celsius, `${fields[i]}.celsius`);
		positive(faults, point.lifeHours, `${fields[i]}.lifeHours`);
		if (before === undefined) return;
		if (point.celsius <= before.celsius) fault(faults, 'points-unsorted', `${fields[i]}.celsius`);
		else if (point.lifeHours > before.lifeHours)
			fault(faults, 'life-longer-when-warmer', `${fields[i]}.lifeHours`);
	});
}

function bandFaults(faults: SpecFault[], bands: readonly Q10Band[]): void {
	if (bands.length === 0) fault(faults, 'points-too-few', 'model.bands');
	bands.forEach((band, i) => {
		const before = bands[i - 1];
		const field = `model.bands.${i}`;
		temperature(faults, band.fromCelsius, `${field}.fromCelsius`);
		temperature(faults, band.toCelsius, `${field}.toCelsius`);
		q10(faults, band.q10, `${field}.q10`);
		if (band.fromCelsius >= band.toCelsius) fault(faults, 'range-upside-down', `${field}.toCelsius`);
		if (before && band.fromCelsius < before.fromCelsius)
			fault(faults, 'points-unsorted', `${field}.fromCelsius`);
		else if (before && band.fromCelsius !== before.toCelsius) {
			fault(faults, 'bands-not-adjoining', `${field}.fromCelsius`);
		}
	});
}

/** Temperatures the model itself knows. */
export function coverOf(model: RateModel): readonly [number, number] {
	if (model.kind === 'life-table') {
		return [
			model.points[0]?.celsius ?? -Infinity,
			model.points[model.points.length - 1]?.celsius ?? Infinity
		];
	}
	if (model.kind === 'banded-q10') {
		return [
			model.bands[0]?.fromCelsius ?? -Infinity,
			model.bands[model.bands.length - 1]?.toCelsius ?? Infinity
		];
	}
	return [-Infinity, Infinity];
}
