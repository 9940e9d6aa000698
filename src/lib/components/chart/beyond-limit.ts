export interface Point {
	ms: number;
	celsius: number;
}

/**
 * The areas between a limit and the trace where the trace is beyond it: each a run of points that begins and ends on
 * the limit, crossings interpolated. A gap (null) ends a run upright.
 */
export function areasBeyond(
	times: ArrayLike<number>,
	celsius: ArrayLike<number | null | undefined>,
	limitCelsius: number,
	side: 'above' | 'below'
): Point[][] {
	const isBeyond = (value: number) => (side === 'above' ? value > limitCelsius : value < limitCelsius);
	const areas: Point[][] = [];
	let area: Point[] | null = null;
	let last: Point | null = null;
	for (let at = 0; at < times.length; at++) {
		const value = celsius[at];
		const ms = times[at];
		if (value === undefined || ms === undefined) continue;
		if (value === null) {
			if (area && last) area.push({ ms: last.ms, celsius: limitCelsius });
			area = last = null;
			continue;
		}
		const point = { ms, celsius: value };
		if (isBeyond(value)) {
			if (!area)
				areas.push((area = [last ? crossing(last, point, limitCelsius) : { ms, celsius: limitCelsius }]));
			area.push(point);
		} else if (area && last) {
			area.push(crossing(last, point, limitCelsius));
			area = null;
		}
		last = point;
	}
	if (area && last) area.push({ ms: last.ms, celsius: limitCelsius });
	return areas;
}

function crossing(from: Point, to: Point, limitCelsius: number): Point {
	const span = to.celsius - from.celsius;
	const fraction = span === 0 ? 0 : (limitCelsius - from.celsius) / span;
	return { ms: from.ms + fraction * (to.ms - from.ms), celsius: limitCelsius };
}
