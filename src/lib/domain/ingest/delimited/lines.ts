/** Where each physical line of a text starts and ends, without its line end. CRLF, LF and CR may mix. */
export interface Lines {
	readonly count: number;
	readonly starts: Int32Array;
	readonly ends: Int32Array;
	readonly isUnterminated: boolean;
}

/** Finds the lines of a text without copying any of it. */
export function findLines(text: string): Lines {
	let capacity = 1024;
	let starts = new Int32Array(capacity);
	let ends = new Int32Array(capacity);
	let count = 0;
	let start = 0;
	const hasReturns = text.includes('\r');
	const push = (end: number): void => {
		if (count === capacity) {
			capacity *= 2;
			starts = grown(starts, capacity);
			ends = grown(ends, capacity);
		}
		starts[count] = start;
		ends[count++] = end;
	};
	let newline = text.indexOf('\n');
	let carriage = hasReturns ? text.indexOf('\r') : -1;
	while (newline >= 0 || carriage >= 0) {
		const isReturn = carriage >= 0 && (newline < 0 || carriage < newline);
		const end = isReturn ? carriage : newline;
		push(end);
		start = isReturn && text.charCodeAt(end + 1) === 10 ? end + 2 : end + 1;
		if (newline >= 0 && newline < start) newline = text.indexOf('\n', start);
		if (carriage >= 0 && carriage < start) carriage = text.indexOf('\r', start);
	}
	const isUnterminated = start < text.length;
	if (isUnterminated) push(text.length);
	return { count, starts: starts.subarray(0, count), ends: ends.subarray(0, count), isUnterminated };
}

function grown(array: Int32Array<ArrayBuffer>, capacity: number): Int32Array<ArrayBuffer> {
	const bigger = new Int32Array(capacity);
	bigger.set(array);
	return bigger;
}
