import { gunzipSync } from 'node:zlib';
import type { Understanding } from '../../src/lib/domain/ingest/ingestion';

/*
 * The criterion is independent of the reader: it decodes by the platform, splits lines by one expression, and asks of
 * each reading whether its figure and its moment can be found on the line that it names. It shares no code with it.
 */

/** The text of a file as the platform decodes it, without the NULs that pad some. */
function textOf(bytes: Buffer, encoding: string): string {
	const plain = bytes[0] === 0x1f && bytes[1] === 0x8b ? gunzipSync(bytes) : bytes;
	const text = new TextDecoder(encoding).decode(plain).replaceAll('\0', '');
	// Node's decoder leaves the dashes of windows-1252 (0x96, 0x97) as controls.
	return text.replace(/[\u0096\u0097]/g, '–');
}

const minus = /[-−‐-―－﹣]\s?$/;

/**
 * All values that the figures of a text can have. Each run of digits may stand alone, or go on behind a point or comma
 * that is the decimal sign, groups thousands, or parts two cells; a dash before it may be a sign or not.
 */
function valuesIn(text: string): number[] {
	const values: number[] = [];
	for (const { 0: digits, index } of text.matchAll(/\d+/g)) {
		const rest = text.slice(index + digits.length, index + digits.length + 24);
		const after = /^[.,](\d+)(?:e[+-]?\d+)?/i.exec(rest);
		const forms = [digits, `${digits}${/^e[+-]?\d+/i.exec(rest)?.[0] ?? ''}`];
		if (after !== null) forms.push(`${digits}.${after[0].slice(1)}`);
		const grouped = /^(?:[.,]\d{3})+(?:[.,]\d+)?/.exec(rest)?.[0];
		if (grouped !== undefined) {
			const last = Math.max(grouped.lastIndexOf('.'), grouped.lastIndexOf(','));
			forms.push(digits + grouped.replace(/[.,]/g, ''));
			forms.push(`${digits}${grouped.slice(0, last).replace(/[.,]/g, '')}.${grouped.slice(last + 1)}`);
		}
		const before = text.slice(Math.max(0, index - 3), index);
		if (/[.,]$/.test(before)) forms.push(`.${digits}`);
		// Some write it behind the figure: 4,5-.
		const isNegative = minus.test(before.replace(/[.,]$/, '')) || /^[.,\d]*\s?[-−–]/.test(rest);
		const sign = isNegative ? [1, -1] : [1];
		for (const form of forms) for (const factor of sign) values.push(Number(form) * factor);
	}
	return values;
}

/** Digit groups of a text as numbers, with the parts of compact stamps (20260401T101500). */
function groupsIn(text: string): Set<number> {
	const groups = new Set<number>();
	for (const digits of text.match(/\d+/g) ?? []) {
		groups.add(Number(digits));
		if (digits.length === 8 || digits.length === 12 || digits.length === 14) {
			groups.add(Number(digits.slice(0, 4)));
			for (let at = 4; at < digits.length; at += 2) groups.add(Number(digits.slice(at, at + 2)));
		}
		if (digits.length === 4 || digits.length === 6)
			for (let at = 0; at < digits.length; at += 2) groups.add(Number(digits.slice(at, at + 2)));
	}
	return groups;
}

const dayMs = 86_400_000;
const quarterMs = 900_000;

/** Whether a moment, shifted by some offset of the world, is written out in these groups. */
function isWritten(ms: number, groups: ReadonlySet<number>, hasWords: boolean): boolean {
	for (let quarter = -56; quarter <= 56; quarter++) {
		for (const isMidnight of [false, true]) {
			const at = new Date(ms + quarter * quarterMs - (isMidnight ? dayMs : 0));
			const hour = at.getUTCHours();
			if (isMidnight && hour !== 0) continue;
			const year = at.getUTCFullYear();
			const isYear = groups.has(year) || groups.has(year % 100);
			const isDay = groups.has(at.getUTCDate()) && (hasWords || groups.has(at.getUTCMonth() + 1));
			const isHour = groups.has(isMidnight ? 24 : hour) || (hasWords && groups.has(hour % 12 || 12));
			const isRest =
				(at.getUTCMinutes() === 0 || groups.has(at.getUTCMinutes())) &&
				(at.getUTCSeconds() === 0 || groups.has(at.getUTCSeconds()) || groups.has(60));
			// A day alone stands for its midnight.
			if (isYear && isDay && isRest && (isHour || hour === 0)) return true;
		}
	}
	return false;
}

const isEpoch = (ms: number, values: readonly number[]): boolean =>
	values.some((value) => [1000, 1, 0.001].some((factor) => Math.abs(value * factor - ms) <= 1));

const blankFirst = /^[\s"]*[,;\t|]/;

/** A date may be written once and left blank below: what stands on the last line above that has one. */
function dateAbove(rows: readonly string[], line: number): Set<number> {
	let at = line - 1;
	while (at > 0 && blankFirst.test(rows[at] ?? '')) at--;
	return at === line - 1 ? new Set() : groupsIn(rows[at] ?? '');
}

/** What a reading lacks in its file; null when it stands there. */
export function lacking(bytes: Buffer, understanding: Understanding): string | null {
	const { layout, channels, temperature, declared } = understanding;
	const channel = channels[temperature];
	const { trace, lines } = channel ?? {};
	if (!trace || !lines) return 'no trace';
	const text = textOf(bytes, layout.encoding);
	const isDelimited = layout.kind === 'delimited';
	const rows = isDelimited ? text.split(/\r\n|\n|\r/) : [text];
	// A sum with a base value, or a time that runs on from a start, stands nowhere as one figure.
	const isSummed = layout.kind === 'senml' && /"b[vt]"/.test(text);
	const isRunning = declared.startMs !== null || isSummed;
	const whole = isDelimited ? null : { values: valuesIn(text), groups: groupsIn(text) };
	for (let i = 0; i < trace.times.length; i++) {
		const line = lines[i] ?? 0;
		let row = rows[isDelimited ? line - 1 : 0] ?? '';
		// A quoted cell may hold line breaks.
		if (isDelimited && row.includes('"')) row = rows.slice(line - 1, line + 3).join('\n');
		const values = whole?.values ?? valuesIn(row);
		const value = (trace.scaled[i] ?? NaN) / 10 ** trace.decimals;
		if (!isSummed && !values.some((written) => Math.abs(written - value) <= 0.000_051))
			return `line ${line}: no ${value} in ${JSON.stringify(row.slice(0, 200))}`;
		const ms = trace.times[i] ?? NaN;
		const groups = whole?.groups ?? new Set([...groupsIn(row), ...dateAbove(rows, line)]);
		if (!isRunning && !isEpoch(ms, values) && !isWritten(ms, groups, /\p{L}/u.test(row)))
			return `line ${line}: no ${new Date(ms).toISOString()} in ${JSON.stringify(row.slice(0, 200))}`;
	}
	return null;
}
