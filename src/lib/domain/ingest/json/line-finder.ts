/** Gives the 1-based line of a place in a text; cheap when asked for places in ascending order. */
export function lineFinder(text: string): (at: number) => number {
	let line = 1;
	let lineStart = 0;
	// Remembered, because minified JSON has no line end and looking for one each time would read the whole text.
	let next = text.indexOf('\n');
	return (at) => {
		if (at < lineStart) {
			line = 1;
			lineStart = 0;
			next = text.indexOf('\n');
		}
		while (next >= 0 && next < at) {
			line++;
			lineStart = next + 1;
			next = text.indexOf('\n', lineStart);
		}
		return line;
	};
}
