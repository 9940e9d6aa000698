export interface Scale {
	from: number;
	to: number;
	ticks: number[];
}

/** A scale that begins and ends on a named tick, with at most `mostTicks` steps and room beyond what is drawn. */
export function scaleTicks(least: number, most: number, mostTicks: number): Scale {
	const span = Math.max(most - least, 1);
	const step = [0.5, 1, 2, 5, 10, 20, 50, 100].find((candidate) => span / candidate <= mostTicks) ?? 200;
	const first = Math.floor(least / step) * step;
	const last = Math.ceil(most / step) * step;
	const ticks: number[] = [];
	for (let at = 0; first + at * step <= last + step / 1000; at++) ticks.push(first + at * step);
	return { from: Math.min(first, least - span * 0.03), to: last, ticks };
}

/** Life starts at zero; a step of whole days, or of weeks for what keeps long. Overdrawn life goes below. */
export function lifeTicks(leastDays: number, fullDays: number, mostTicks: number): Scale {
	const step =
		[0.5, 1, 2, 3, 6, 7, 14, 28, 56, 91, 182, 364].find((days) => fullDays / days <= mostTicks) ?? 728;
	const from = leastDays < 0 ? Math.floor(leastDays / step) * step : 0;
	const ticks: number[] = [];
	for (let at = from; at <= fullDays + step / 1000; at += step) ticks.push(at);
	return { from, to: Math.max(fullDays, ticks.at(-1) ?? fullDays), ticks };
}
