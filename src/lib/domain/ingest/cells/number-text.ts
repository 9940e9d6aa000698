import { maxDecimals } from '../bounds';
import type { TemperatureUnit } from '../../units';
import { isUnitCell, wholeUnitOf } from './unit-words';
import { isMissingWord } from './missing-words';

export type NumberState = 'number' | 'missing' | 'text';

/** Filled by {@link scanNumber}: reused over a whole column, so that no row allocates. */
export interface NumberText {
	/** The digits as an integer; the value is mantissa × 10^-decimals. */
	mantissa: number;
	decimals: number;
	unit: TemperatureUnit | null;
	hasComma: boolean;
}

export function emptyNumber(): NumberText {
	return { mantissa: 0, decimals: 0, unit: null, hasComma: false };
}

const isSpace = (code: number): boolean =>
	code === 32 || code === 9 || code === 0xa0 || code === 0x202f || code === 0x2009 || code === 0xfeff;

/** Hyphen, minus, the dashes people and word processors put for it, and their full-width form. */
const isMinus = (code: number): boolean =>
	code === 0x2d ||
	code === 0x2212 ||
	(code >= 0x2010 && code <= 0x2014) ||
	code === 0xff0d ||
	code === 0xfe63;

interface Digits {
	value: number;
	count: number;
	decimals: number;
	separators: number;
	end: number;
	hasComma: boolean;
	isBroken: boolean;
}
const digits: Digits = {
	value: 0,
	count: 0,
	decimals: 0,
	separators: 0,
	end: 0,
	hasComma: false,
	isBroken: false
};

/**
 * A lone point or comma is the decimal sign, whichever it is; of two kinds the last is; the same one twice groups
 * thousands. Temperatures have no thousands, so `1,234` is never read as one thousand.
 */
function scanDigits(text: string, from: number): void {
	digits.value = digits.count = digits.decimals = digits.separators = 0;
	digits.hasComma = digits.isBroken = false;
	let lastSeparator = 0;
	let fraction = 0;
	let i = from;
	for (; i < text.length; i++) {
		const code = text.charCodeAt(i);
		if (code >= 48 && code <= 57) {
			if (lastSeparator !== 0 && fraction >= maxDecimals + 2) continue;
			digits.value = digits.value * 10 + (code - 48);
			digits.count++;
			if (lastSeparator !== 0) fraction++;
		} else if (code === 46 || code === 44) {
			if (lastSeparator !== 0 && fraction !== 3) digits.isBroken = true;
			if (lastSeparator === code && digits.separators > 1) digits.isBroken ||= fraction !== 3;
			if (code === 44) digits.hasComma = true;
			digits.separators++;
			fraction = 0;
			lastSeparator = lastSeparator === code ? -code : code;
		} else break;
	}
	digits.end = i;
	digits.decimals = lastSeparator < 0 ? 0 : fraction;
	if (lastSeparator !== 0 && fraction === 0) digits.isBroken = true;
}

/** Rounds once: 2.17764770 is 2.1776, though rounding it digit by digit would give 2.1777. */
function roundToBound(into: NumberText): void {
	if (into.decimals <= maxDecimals) return;
	into.mantissa = Math.round(into.mantissa / 10 ** (into.decimals - maxDecimals));
	into.decimals = maxDecimals;
}

/** Reads a cell as a number with an optional unit; `missing` for blanks and words that stand for no value. */
export function scanNumber(text: string, into: NumberText): NumberState {
	const state = scanPlain(text, into);
	if (state !== 'text' || text.length > longestFigure || !anyDigit.test(text)) return state;
	const plain = plainFigure(text);
	return plain === null ? state : scanPlain(plain, into);
}

/** Longer cells are sentences. */
const longestFigure = 40;
const anyDigit = /[\d\uff10-\uff19]/;
const figure = String.raw`[-+\u2212]?\s?\d+(?:[.,]\d+)?`;
const unitSign = String.raw`(?:°|º|˚)\s?[CF]|℃|℉`;
const unitFirst = new RegExp(`^(${unitSign})\\s*(${figure})$`, 'i');
const minusLast = /^(\d+(?:[.,]\d+)?)\s?[-\u2212]$/;
/** A mark or letter behind the figure that says the value lies outside the limits. */
const flagged = new RegExp(
	`^(${figure}\\s*(?:${unitSign}|[CFK])?)\\s*(?:[*!^#↑↓▲▼]+|\\((?:HI?|LO?|H{2}|L{2}|high|low|alarm)\\)|\\s(?:HI?|LO?|H{2}|L{2}|high|low|alarm))$`,
	'i'
);

/** A raised, lowered or circled digit that no letter stands before (m²) is a footnote, not a figure. */
const footnote = /(?<!\p{L})\p{No}/u;

/** The figure of a cell that is written in an unusual way, as others would write it; null when it holds none. */
function plainFigure(text: string): string | null {
	if (footnote.test(text)) return null;
	const bare = text
		.normalize('NFKC')
		.trim()
		.replace(/^(?:=?"|')(.*?)["']?$/, '$1')
		.trim();
	const prefixed = unitFirst.exec(bare);
	if (prefixed !== null) return `${prefixed[2]} ${prefixed[1]}`;
	const negative = minusLast.exec(bare);
	if (negative !== null) return `-${negative[1]}`;
	const marked = flagged.exec(bare);
	if (marked !== null) return marked[1] ?? null;
	return bare === text ? null : bare;
}

function scanPlain(text: string, into: NumberText): NumberState {
	let i = 0;
	while (i < text.length && isSpace(text.charCodeAt(i))) i++;
	if (i === text.length) return 'missing';
	let isNegative = false;
	let code = text.charCodeAt(i);
	if (isMinus(code) || code === 43) {
		isNegative = code !== 43;
		i++;
		while (i < text.length && isSpace(text.charCodeAt(i))) i++;
	}
	code = text.charCodeAt(i);
	if (!((code >= 48 && code <= 57) || code === 46 || code === 44))
		return isMissingWord(text) ? 'missing' : 'text';
	scanDigits(text, i);
	if (digits.isBroken || digits.count === 0 || digits.count > 15) return 'text';
	into.mantissa = isNegative && digits.value !== 0 ? -digits.value : digits.value;
	into.decimals = digits.decimals;
	into.hasComma = digits.hasComma;
	into.unit = null;
	if (digits.end < text.length && !readSuffix(text.slice(digits.end), into))
		return isMissingWord(text) ? 'missing' : 'text';
	roundToBound(into);
	return 'number';
}

function readSuffix(rest: string, into: NumberText): boolean {
	const suffix = rest.trim();
	if (suffix === '') return true;
	const power = /^e([+-]?\d{1,2})$/i.exec(suffix);
	if (power !== null) {
		into.decimals -= Number(power[1]);
		while (into.decimals < 0 && Math.abs(into.mantissa) < 1e12) {
			into.mantissa *= 10;
			into.decimals++;
		}
		// A figure beyond all bounds (1E+30 for "no sensor") is one still, and as such set aside.
		if (into.decimals < 0) into.decimals = 0;
		return into.decimals < 20;
	}
	into.unit = wholeUnitOf(suffix);
	return into.unit !== null || isUnitCell(suffix);
}
