import { getBOMEncoding, TextDecoder } from '@exodus/bytes/encoding.js';

export interface DecodedText {
	readonly text: string;
	readonly encoding: string;
}

/** Header words that only come out when the bytes are read in the right East Asian or Central European encoding. */
const tellingWords: readonly { encoding: string; words: RegExp }[] = [
	{ encoding: 'shift_jis', words: /温度|湿度|日時|日付|時刻|測定|記録|℃/ },
	{ encoding: 'gb18030', words: /温度|湿度|时间|日期|序号|记录|℃/ },
	{ encoding: 'euc-jp', words: /温度|湿度|日時|日付|時刻|測定|記録/ },
	{ encoding: 'big5', words: /溫度|濕度|時間|日期|序號|記錄|℃/ },
	{ encoding: 'euc-kr', words: /온도|습도|시간|날짜|일시|℃/ },
	{ encoding: 'windows-1251', words: /температура|влажность|дата|время/i },
	{
		encoding: 'windows-1250',
		words: /wilgotność|początek|średnia|teplota|vlhkost|čas|hőmérséklet|urządzeni|numer seryjny.*[ąęłśż]/i
	},
	{ encoding: 'iso-8859-2', words: /wilgotność|początek|średnia|vlhkosť|začátek|začiatok/i },
	{ encoding: 'windows-1257', words: /drėgm|temperatūra|mitrums|sērijas|pradžia|niiskus.*[õüä]/i },
	{ encoding: 'windows-1258', words: /nhiệt|độ|thời gian/i },
	{ encoding: 'windows-1254', words: /sıcaklık|başlangıç|sıcaklığı/i },
	{ encoding: 'koi8-r', words: /температура|влажность|дата и время/i },
	{ encoding: 'windows-1253', words: /θερμοκρασία|υγρασία|ημερομηνία/i },
	{ encoding: 'windows-1255', words: /טמפרטורה|תאריך/ },
	{ encoding: 'windows-1256', words: /الحرارة|التاريخ/ },
	{ encoding: 'windows-874', words: /อุณหภูมิ|ความชื้น/ }
];

function decodeAs(bytes: Uint8Array, encoding: string, isFatal: boolean): string | null {
	try {
		return new TextDecoder(encoding, { fatal: isFatal }).decode(bytes);
	} catch {
		// A fatal decoder throws on bytes that are not text in this encoding: that is the answer.
		return null;
	}
}

/** UTF-16 without a mark shows as a NUL in every second byte of plain text. */
function silentUtf16(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | null {
	const end = Math.min(bytes.length, 4096) & ~1;
	if (end < 8) return null;
	let evenNuls = 0;
	let oddNuls = 0;
	for (let i = 0; i < end; i += 2) {
		if (bytes[i] === 0) evenNuls++;
		if (bytes[i + 1] === 0) oddNuls++;
	}
	const half = end / 2;
	if (oddNuls > half * 0.6 && evenNuls < half * 0.1) return 'utf-16le';
	if (evenNuls > half * 0.6 && oddNuls < half * 0.1) return 'utf-16be';
	return null;
}

/** Beyond the heads a file is mostly ASCII, which is read many times faster where it stands by itself. */
const headBytes = 65_536;
const lineFeed = 10;

/** Whole UTF-8, decoded in two at a line end, which is part of no character; null where it is none. */
function decodeWhole(bytes: Uint8Array): string | null {
	const end = bytes.length < 4 * headBytes ? -1 : bytes.indexOf(lineFeed, headBytes);
	if (end < 0) return decodeAs(bytes, 'utf-8', true);
	const head = decodeAs(bytes.subarray(0, end), 'utf-8', true);
	const rest = head === null ? null : decodeAs(bytes.subarray(end), 'utf-8', true);
	return head === null || rest === null ? null : head + rest;
}

/** A file cut in the middle of a character is still UTF-8: up to three trailing bytes may be missing their rest. */
function decodeUtf8(bytes: Uint8Array): string | null {
	const whole = decodeWhole(bytes);
	if (whole !== null) return whole;
	for (let dropped = 1; dropped <= 3 && dropped < bytes.length; dropped++) {
		const last = bytes[bytes.length - dropped] ?? 0;
		if (last >= 0xc2) return decodeAs(bytes.subarray(0, bytes.length - dropped), 'utf-8', true);
		if (last < 0x80) return null;
	}
	return null;
}

/** A stray byte in UTF-8 (a note in another encoding) is outweighed by the letters that came out whole. */
function decodeMendedUtf8(bytes: Uint8Array): string | null {
	const text = decodeAs(bytes, 'utf-8', false) ?? '';
	let [broken, whole] = [0, 0];
	for (let i = 0; i < text.length; i++) {
		const code = text.charCodeAt(i);
		if (code === 0xfffd) broken++;
		else if (code > 0x7f) whole++;
	}
	return whole >= 4 * broken ? text : null;
}

/** Bytes to text by what they show: mark, NUL pattern, valid UTF-8, telling words, else windows-1252. */
export function decodeText(bytes: Uint8Array): DecodedText {
	const marked = getBOMEncoding(bytes);
	const wide = marked === null ? silentUtf16(bytes) : null;
	const sure = marked ?? wide;
	if (sure !== null) return { text: decodeAs(bytes, sure, false) ?? '', encoding: sure };
	const utf8 = decodeUtf8(bytes);
	if (utf8 !== null) return { text: utf8, encoding: 'utf-8' };
	const mended = decodeMendedUtf8(bytes);
	if (mended !== null) return { text: mended, encoding: 'utf-8' };
	const head = bytes.subarray(0, 65_536);
	for (const { encoding, words } of tellingWords) {
		const text = decodeAs(head, encoding, false);
		if (text === null || !words.test(text)) continue;
		return { text: decodeAs(bytes, encoding, false) ?? '', encoding };
	}
	return { text: decodeAs(bytes, 'windows-1252', false) ?? '', encoding: 'windows-1252' };
}
