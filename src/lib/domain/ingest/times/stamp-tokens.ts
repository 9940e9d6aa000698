/** A number of a time text, with the character that stood before it (a space when only spaces did). */
export interface StampTokens {
	count: number;
	readonly value: Float64Array;
	readonly digits: Uint8Array;
	readonly before: Uint16Array;
	/** 1 once the number has been taken as part of the time. */
	readonly used: Uint8Array;
	words: string[];
	/** How many numbers stood before each word. */
	wordAt: number[];
	/** Index of the word that named the half of the day; −1 without one. */
	halfWord: number;
}

const most = 12;

export function emptyTokens(): StampTokens {
	return {
		count: 0,
		value: new Float64Array(most),
		digits: new Uint8Array(most),
		before: new Uint16Array(most),
		used: new Uint8Array(most),
		words: [],
		wordAt: [],
		halfWord: -1
	};
}

/** Marks that Chinese, Japanese and Korean put after year, month, day, hour, minute: 年月日時分 and their kin. */
const eastAsian: Readonly<Record<string, number>> = {
	年: 45,
	月: 45,
	日: 32,
	号: 32,
	時: 58,
	时: 58,
	点: 58,
	分: 58,
	秒: 32,
	년: 45,
	월: 45,
	일: 32,
	시: 58,
	분: 58,
	초: 32
};

/** Digits, letters and marks as wide as East Asian characters. */
const fullWidth = /[\uff01-\uff5e]/;

const isDigit = (code: number): boolean => code >= 48 && code <= 57;
const isLetter = (code: number): boolean =>
	(code >= 65 && code <= 90) ||
	(code >= 97 && code <= 122) ||
	(code >= 0xc0 && code !== 0xd7 && code !== 0xf7 && code < 0x2000) ||
	code > 0x2fff;

function readNumber(text: string, from: number, before: number, tokens: StampTokens): number {
	let i = from;
	let value = 0;
	while (i < text.length && isDigit(text.charCodeAt(i))) value = value * 10 + (text.charCodeAt(i++) - 48);
	if (i - from > 17) return -1;
	const at = tokens.count++;
	tokens.value[at] = value;
	tokens.digits[at] = i - from;
	tokens.before[at] = before;
	tokens.used[at] = 0;
	return i;
}

function readWord(text: string, from: number, tokens: StampTokens): number {
	let i = from;
	while (i < text.length && isLetter(text.charCodeAt(i)) && eastAsian[text[i] ?? ''] === undefined) i++;
	// "a. m.", "p.m.", "π.μ.", "v.m." are one word each.
	const dotted =
		i - from === 1 ? /^([apvnπμ])\.?\s?([mμ])(?!\p{L})\.?/iu.exec(text.slice(from, from + 5)) : null;
	if (dotted !== null) {
		tokens.words.push(`${dotted[1]}${dotted[2]}`.toLowerCase());
		i = from + dotted[0].length;
	} else tokens.words.push(text.slice(from, i).toLowerCase());
	tokens.wordAt.push(tokens.count);
	return i;
}

/** Splits a time text into numbers and words; false when it cannot be one. */
export function tokenise(written: string, tokens: StampTokens): boolean {
	const text = fullWidth.test(written) ? written.normalize('NFKC') : written;
	tokens.count = 0;
	tokens.halfWord = -1;
	if (tokens.words.length > 0) {
		tokens.words = [];
		tokens.wordAt = [];
	}
	if (text.length > 60) return false;
	let before = 0;
	for (let i = 0; i < text.length;) {
		const code = text.charCodeAt(i);
		if (isDigit(code)) {
			if (tokens.count >= most) return false;
			i = readNumber(text, i, before, tokens);
			if (i < 0) return false;
			before = 32;
			// A space only separates where nothing else does.
			if (i < text.length && !isDigit(text.charCodeAt(i))) before = 0;
			continue;
		}
		const mark = code > 0x2fff ? eastAsian[text[i] ?? ''] : undefined;
		if (mark === undefined && isLetter(code)) {
			i = readWord(text, i, tokens);
			before = 1;
			continue;
		}
		if (
			mark === undefined &&
			code > 127 &&
			code !== 0xa0 &&
			code !== 0x202f &&
			code !== 0x2212 &&
			code !== 0xb0
		)
			return false;
		const sign = mark ?? (code === 0x2212 ? 45 : code);
		if (sign !== 32 && sign !== 0xa0 && sign !== 0x202f && sign !== 9) before = sign;
		else if (before === 0) before = 32;
		i++;
	}
	return tokens.count > 0;
}
