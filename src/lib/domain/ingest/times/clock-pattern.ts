/**
 * The clock of a time cell, for cells that are alike but for their clock digits: what stands before and after the
 * clock is compared with a cell that was read in full, and only `H:MM` or `H:MM:SS` is read anew.
 */
export interface ClockPattern {
	/** Takes a cell whose moment is known as the pattern; false where its form is not plain enough. */
	learn(from: number, to: number, msOfDay: number): boolean;
	/** Milliseconds since midnight of a cell of the same form, or -1. */
	read(from: number, to: number): number;
}

const colon = 58;
const isDigit = (code: number): boolean => code >= 48 && code <= 57;

/** Letters may change how the hour is read (a. m., p. m.); only those of ISO 8601 do not. */
const isNeutral = (code: number): boolean =>
	isDigit(code) || (code >= 32 && code < 48) || code === colon || code === 84 || code === 90;

/** A pattern over cells of one text. */
export function clockPatternOf(text: string): ClockPattern {
	let patternFrom = -1;
	let prefixLength = 0;
	let suffixFrom = 0;
	let suffixLength = 0;
	let hasSeconds = false;
	let restMs = 0;
	let clockEnd = 0;

	const two = (at: number): number => {
		const [tens, ones] = [text.charCodeAt(at), text.charCodeAt(at + 1)];
		return isDigit(tens) && isDigit(ones) ? tens * 10 + ones - 528 : -1;
	};

	/** Reads the clock at `at`, moving `clockEnd` behind it; -1 where there is none. */
	function clockAt(at: number, end: number, withSeconds: boolean): number {
		let i = at;
		let hours = 0;
		for (; i < end && i < at + 2 && isDigit(text.charCodeAt(i)); i++)
			hours = hours * 10 + text.charCodeAt(i) - 48;
		clockEnd = i + (withSeconds ? 6 : 3);
		if (i === at || hours > 23 || clockEnd > end || text.charCodeAt(i) !== colon) return -1;
		const minutes = two(i + 1);
		if (minutes < 0 || minutes > 59) return -1;
		if (!withSeconds) return (hours * 60 + minutes) * 60_000;
		const seconds = text.charCodeAt(i + 3) === colon ? two(i + 4) : -1;
		return seconds < 0 || seconds > 59 ? -1 : ((hours * 60 + minutes) * 60 + seconds) * 1000;
	}

	function learn(from: number, to: number, msOfDay: number): boolean {
		patternFrom = -1;
		for (let i = from; i < to; i++) if (!isNeutral(text.charCodeAt(i))) return false;
		const firstColon = text.indexOf(':', from);
		if (firstColon < 0 || firstColon >= to) return false;
		let hourFrom = firstColon;
		while (hourFrom > from && isDigit(text.charCodeAt(hourFrom - 1))) hourFrom--;
		hasSeconds = text.charCodeAt(firstColon + 3) === colon;
		const clockMs = clockAt(hourFrom, to, hasSeconds);
		const next = clockEnd < to ? text.charCodeAt(clockEnd) : 0;
		if (clockMs < 0 || isDigit(next) || next === colon) return false;
		restMs = msOfDay - clockMs;
		if (restMs < 0 || restMs >= 1000) return false;
		patternFrom = from;
		prefixLength = hourFrom - from;
		suffixFrom = clockEnd;
		suffixLength = to - clockEnd;
		return true;
	}

	function read(from: number, to: number): number {
		if (patternFrom < 0) return -1;
		for (let i = 0; i < prefixLength; i++)
			if (text.charCodeAt(from + i) !== text.charCodeAt(patternFrom + i)) return -1;
		const clockMs = clockAt(from + prefixLength, to, hasSeconds);
		if (clockMs < 0 || to - clockEnd !== suffixLength) return -1;
		for (let i = 0; i < suffixLength; i++)
			if (text.charCodeAt(clockEnd + i) !== text.charCodeAt(suffixFrom + i)) return -1;
		return clockMs + restMs;
	}

	return { learn, read };
}
