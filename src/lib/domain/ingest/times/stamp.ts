import { isWeekday, monthOfName } from './month-names';
import { readOffset, readTime } from './stamp-clock';
import { readDate } from './stamp-date';
import { fillers } from './stamp-fillers';
import { digitsOf, noOffset, noTime, tokens, type Stamp } from './stamp-parts';
import { tokenise } from './stamp-tokens';
import { ianaWithin } from './zone';
import { zoneMeanings } from './zone-words';

export { emptyStamp, noOffset, noTime, type Stamp } from './stamp-parts';

function readWords(into: Stamp): number {
	let month = 0;
	for (let w = 0; w < tokens.words.length; w++) {
		const word = tokens.words[w] ?? '';
		if (w === tokens.halfWord) continue;
		if (word === 'z' || word === 'utc' || word === 'gmt') {
			if (into.offsetMinutes === noOffset) into.offsetMinutes = 0;
		} else if (fillers.has(word)) continue;
		else if (readZoneLetters(into, word, tokens.wordAt[w] ?? 0)) continue;
		else if (month === 0 && monthOfName(word) > 0) month = monthOfName(word);
		else if (isWeekday(word)) continue;
		else if (monthOfName(word) > 0) month = monthOfName(word);
		else return -1;
	}
	return month;
}

/** Letters after the clock that name a zone: one offset is taken, several meanings are kept to be asked about. */
function readZoneLetters(into: Stamp, word: string, at: number): boolean {
	if (into.msOfDay === noTime || at === 0 || tokens.used[at - 1] !== 1) return false;
	const meanings = zoneMeanings(word);
	const [first] = meanings;
	if (first === undefined) return false;
	if (into.offsetMinutes !== noOffset) return true;
	if (meanings.length === 1) into.offsetMinutes = first.minutes;
	else into.zoneWord = word;
	return true;
}

/** Reads one time text. False when it is none; the numbers of an open date are kept as they stood. */
export function scanStamp(text: string, into: Stamp): boolean {
	if (scanPlain(text, into)) return true;
	// 2026-04-14T11:00+02:00[Europe/Berlin], or the zone's name after the time.
	const slash = text.indexOf('/');
	if (slash < 1 || text.length > 80 || !/[A-Za-z]\/[A-Z]/.test(text)) return false;
	const zone = ianaWithin(text);
	if (zone === null) return false;
	const bare = text.replace(/\[?\(?[A-Za-z_]+\/[\w/+-]+\]?\)?/, ' ');
	if (!scanPlain(bare, into) || into.msOfDay === noTime) return false;
	if (into.offsetMinutes === noOffset) into.zoneWord = zone;
	return true;
}

function scanPlain(text: string, into: Stamp): boolean {
	into.shape = 'none';
	into.msOfDay = noTime;
	into.offsetMinutes = noOffset;
	into.zoneWord = null;
	into.isOrdinal = false;
	if (!tokenise(text, tokens)) return false;
	// One bare number is a count or a temperature unless it is a compact date.
	if (tokens.count === 1 && tokens.words.length === 0 && digitsOf(0) < 8) return false;
	if (!readTime(into) || !readOffset(into)) return false;
	const month = readWords(into);
	if (month < 0 || !readDate(into, month)) return false;
	return into.shape !== 'none' || into.msOfDay !== noTime;
}
