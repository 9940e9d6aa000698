/** How a trace is drawn; dashes in px, none is a whole line. */
export interface LineStyle {
	dash: readonly number[];
	widthPx: number;
	isInk: boolean;
}

/** The one that is read at the crosshair. */
export const primaryStyle: LineStyle = { dash: [], widthPx: 1.7, isInk: true };

const dashes: readonly (readonly number[])[] = [
	[],
	[6, 3],
	[2, 2.5],
	[10, 3, 2, 3],
	[12, 5],
	[5, 2, 1.5, 2, 1.5, 2]
];

/** By its place among the loggers of the load, so that a line keeps its look whatever else is drawn. Twelve differ. */
export function lineStyle(at: number): LineStyle {
	const isThick = Math.floor(at / dashes.length) % 2 === 1;
	return { dash: dashes[at % dashes.length] ?? [], widthPx: isThick ? 2.2 : 1.2, isInk: false };
}
