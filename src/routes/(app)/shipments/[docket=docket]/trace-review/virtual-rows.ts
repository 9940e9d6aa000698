/** Which rows of a long table are drawn, and where. */
export interface VirtualRows {
	first: number;
	/** One past the last. */
	end: number;
	/** Of the first one drawn, in the scrolled content. */
	topPx: number;
	contentPx: number;
}

export interface TableRoom {
	count: number;
	rowPx: number;
	/** What shows of the rows. */
	heightPx: number;
	scrollPx: number;
}

/** Rows drawn beyond what shows, above and below, so that a quick wheel finds them there. */
const sparePerSide = 6;
/** Taller than this no browser lays out an element to the pixel: past it, scrolling is stretched over all rows. */
const tallestPx = 8_000_000;

export function virtualRows(room: TableRoom): VirtualRows {
	const { count, rowPx, heightPx, scrollPx } = room;
	const contentPx = Math.min(count * rowPx, tallestPx);
	const top = topRow(room);
	const shown = Math.ceil(heightPx / rowPx) + 1;
	const first = Math.max(0, Math.floor(top) - sparePerSide);
	const end = Math.min(count, Math.floor(top) + shown + sparePerSide);
	// Drawn where the scrolling is, as far above its edge as the rows before it reach.
	const topPx = Math.min(scrollPx, Math.max(0, contentPx - heightPx)) - (top - first) * rowPx;
	return { first, end: Math.max(first, end), topPx, contentPx };
}

/** The row at the upper edge, with the part of it that is above. */
function topRow({ count, rowPx, heightPx, scrollPx }: TableRoom): number {
	const mostPx = mostScroll({ count, rowPx, heightPx });
	if (mostPx <= 0) return 0;
	const atPx = Math.min(mostPx, Math.max(0, scrollPx));
	if (count * rowPx <= tallestPx) return atPx / rowPx;
	const share = atPx / mostPx;
	return share * (count - heightPx / rowPx);
}

function mostScroll({ count, rowPx, heightPx }: Omit<TableRoom, 'scrollPx'>): number {
	return Math.min(count * rowPx, tallestPx) - heightPx;
}

/** Where to scroll so that a row shows: not at all where it does, else as little as brings it to the nearer edge. */
export function scrollToShow(room: TableRoom, row: number): number {
	const { count, rowPx, heightPx, scrollPx } = room;
	const top = topRow(room);
	const fits = heightPx / rowPx;
	if (row >= top && row + 1 <= top + fits) return scrollPx;
	const wanted = row < top ? row : row + 1 - fits;
	const rows = count - fits;
	if (rows <= 0) return 0;
	if (count * rowPx <= tallestPx) return wanted * rowPx;
	return Math.min(1, Math.max(0, wanted / rows)) * mostScroll(room);
}

/** Where a key takes the chosen row; null leaves it to the browser. */
export function rowByKey(key: string, row: number, count: number, pageRows: number): number | null {
	const moved: Record<string, number> = {
		ArrowDown: row + 1,
		ArrowUp: row - 1,
		PageDown: row + Math.max(1, pageRows),
		PageUp: row - Math.max(1, pageRows),
		Home: 0,
		End: count - 1
	};
	const next = moved[key];
	return next === undefined ? null : Math.min(count - 1, Math.max(0, next));
}
