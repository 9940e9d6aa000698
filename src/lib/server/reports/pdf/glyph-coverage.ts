/** Code points a TrueType face maps to a glyph, from its Unicode character map. Source: OpenType 1.9, `cmap`. */
export function coverageOf(font: Uint8Array): ReadonlySet<number> {
	const view = new DataView(font.buffer, font.byteOffset, font.byteLength);
	const table = tableOffset(view, 'cmap');
	const covered = new Set<number>();
	for (let i = 0; i < view.getUint16(table + 2); i++) {
		const record = table + 4 + i * 8;
		const platform = view.getUint16(record);
		if (platform !== 0 && platform !== 3) continue;
		const subtable = table + view.getUint32(record + 4);
		const format = view.getUint16(subtable);
		if (format === 4) addSegments(view, subtable, covered);
		if (format === 12) addGroups(view, subtable, covered);
	}
	return covered;
}

function tableOffset(view: DataView, tag: string): number {
	for (let i = 0; i < view.getUint16(4); i++) {
		const record = 12 + i * 16;
		const name = [0, 1, 2, 3].map((at) => String.fromCharCode(view.getUint8(record + at))).join('');
		if (name === tag) return view.getUint32(record + 8);
	}
	throw new Error(`The font has no ${tag} table`);
}

/** Format 4: segments of the basic plane, each with a delta or a glyph array. */
function addSegments(view: DataView, subtable: number, covered: Set<number>): void {
	const bytes = view.getUint16(subtable + 6);
	const ends = subtable + 14;
	const starts = ends + bytes + 2;
	for (let i = 0; i < bytes; i += 2) {
		const delta = view.getUint16(starts + bytes + i);
		const rangeAt = starts + 2 * bytes + i;
		const range = view.getUint16(rangeAt);
		const start = view.getUint16(starts + i);
		for (let code = start; code <= view.getUint16(ends + i) && code < 0xffff; code++) {
			const listed = range === 0 ? code : view.getUint16(rangeAt + range + 2 * (code - start));
			if (listed !== 0 && ((listed + delta) & 0xffff) !== 0) covered.add(code);
		}
	}
}

/** Format 12: groups over all planes. */
function addGroups(view: DataView, subtable: number, covered: Set<number>): void {
	for (let i = 0; i < view.getUint32(subtable + 12); i++) {
		const group = subtable + 16 + i * 12;
		for (let code = view.getUint32(group); code <= view.getUint32(group + 4); code++) covered.add(code);
	}
}
