import { gzipSync } from 'node:zlib';

/*
 * The journeys that the odd files are written from. Expectations are these figures themselves, never what the reader
 * made of a file: a case is right when every instant and every tenth of a degree comes back.
 */

export interface Point {
	readonly ms: number;
	readonly tenths: number;
}

/** 24 readings, half an hour apart, over midnight and below zero; the 14th and 15th settle the order of dates. */
export const journey: readonly Point[] = [
	21, 24, 30, 28, 20, 12, 5, 0, -5, -11, -8, 3, 15, 22, 41, 57, 63, 60, 48, 40, 36, 33, 30, 29
].map((tenths, i) => ({ ms: Date.UTC(2026, 2, 14, 18) + i * 1_800_000, tenths }));

export const two = (n: number): string => String(n).padStart(2, '0');
export const iso = ({ ms }: Point): string => new Date(ms).toISOString().slice(0, 19) + 'Z';
export const day = ({ ms }: Point): string => new Date(ms).toISOString().slice(0, 10);
export const clock = ({ ms }: Point): string => new Date(ms).toISOString().slice(11, 16);
/** 14.03.2026, 14/03/2026 … */
export const dmy = (point: Point, sign = '.'): string => day(point).split('-').reverse().join(sign);
export const degrees = ({ tenths }: Point, sign = '.'): string => (tenths / 10).toFixed(1).replace('.', sign);
/** °F in hundredths: exact, because a tenth of a degree Celsius is 0.18 °F. */
export const fahrenheit = ({ tenths }: Point): string => ((tenths * 18 + 3200) / 100).toFixed(2);

/** One line a reading, between what stands above and below. */
export function file(
	above: readonly string[],
	line: (point: Point, i: number) => string,
	below: readonly string[] = [],
	end = '\n',
	points: readonly Point[] = journey
): string {
	return [...above, ...points.map(line), ...below].join(end) + end;
}

export type Channel = readonly [name: string, quantity: string];

export interface Read {
	readonly readings?: readonly Point[];
	/** Codes of all oddities but `zone-assumed`, which every local time carries. */
	readonly oddities?: readonly string[];
	readonly counts?: Readonly<Record<string, number>>;
	readonly channels?: readonly Channel[];
	readonly serial?: string;
	readonly unit?: string;
	readonly encoding?: string;
	readonly delimiter?: string | null;
}

export interface Asked {
	readonly question: string;
	readonly choices?: readonly string[];
	/** Each answer with what must then be read. */
	readonly then: readonly (Read & { readonly answers: Record<string, unknown> })[];
}

export interface Refused {
	readonly refused: string | readonly string[];
	readonly line?: number;
	readonly found?: string;
}

export interface Case {
	readonly name: string;
	readonly file: string | Uint8Array;
	readonly expected: Read | Asked | Refused;
}

export const utf8 = (text: string): Uint8Array => new TextEncoder().encode(text);
export const gzip = (text: string | Uint8Array): Uint8Array => gzipSync(text);
export const bytes = (...values: readonly number[]): Uint8Array => Uint8Array.from(values);

/** Bytes of a text in UTF-16, with or without a mark. */
export function utf16(text: string, isBig: boolean, isMarked: boolean): Uint8Array {
	const all = (isMarked ? '\ufeff' : '') + text;
	const out = new Uint8Array(all.length * 2);
	const view = new DataView(out.buffer);
	for (let i = 0; i < all.length; i++) view.setUint16(i * 2, all.charCodeAt(i), !isBig);
	return out;
}
