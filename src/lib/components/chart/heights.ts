import type { ChartModel } from './chart-model';
import type { Layout } from './drawing';
import { lifeTicks, scaleTicks, type Scale } from './scale';

export const lifePaddingPx = 7;
/** The strip of legs between the panels, its margins included. */
export const stripPx = 42;

export function temperatureScale(model: ChartModel): Scale {
	return scaleTicks(model.temperatures.least, model.temperatures.most, 7);
}

export function lifeScale(model: ChartModel): Scale {
	const [, , low = [], high = []] = model.life ?? [];
	// The spec's own uncertainty can lift the high over the full life: the band is shown whole.
	return lifeTicks(Math.min(0, leastOf(low)), Math.max(model.fullDays, mostOf(high)), 4);
}

function mostOf(column: ArrayLike<number | null | undefined>): number {
	let most = -Infinity;
	for (let at = 0; at < column.length; at++) {
		const value = column[at];
		if (typeof value === 'number' && value > most) most = value;
	}
	return most;
}

function leastOf(column: ArrayLike<number | null | undefined>): number {
	let least = Infinity;
	for (let at = 0; at < column.length; at++) {
		const value = column[at];
		if (typeof value === 'number' && value < least) least = value;
	}
	return least;
}

/** Heights of the crosshair's two points in the figure; a reading that is missing has none. */
export function pointHeights(
	model: ChartModel,
	layout: Layout,
	at: { temperature: number | null; lifeDays: number | null }
): number[] {
	const heights: number[] = [];
	if (at.temperature !== null) {
		const roomPx = layout.temperaturePx - layout.topPx - layout.axisPx;
		heights.push(layout.topPx + roomPx * depth(temperatureScale(model), at.temperature));
	}
	if (at.lifeDays !== null && model.life) {
		const topPx = layout.temperaturePx + (model.legs.length > 0 ? stripPx : 0) + lifePaddingPx;
		heights.push(topPx + (layout.lifePx - 2 * lifePaddingPx) * depth(lifeScale(model), at.lifeDays));
	}
	return heights;
}

/** How far down its panel a value stands, 0 at the top. */
function depth(scale: Scale, value: number): number {
	return (scale.to - value) / (scale.to - scale.from);
}
