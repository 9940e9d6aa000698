import type { Quantity } from '../../trace/trace';
import * as known from './lexicon';
import { bound, derived } from './lexicon-besides';
import { further, joinedLexeme } from './lexicon-languages';
import { foldWord } from '../times/month-names';

type Lexeme = known.Lexeme;
const { shock, other, limit, otherClock } = known;
const temperature = joinedLexeme(known.temperature, further.temperature);
const humidity = joinedLexeme(known.humidity, further.humidity);
const dewPoint = joinedLexeme(known.dewPoint, further.dewPoint);
const light = joinedLexeme(known.light, further.light);
const index = joinedLexeme(known.index, further.index);
const time = joinedLexeme(known.time, further.time);
const elapsed = joinedLexeme(known.elapsed, further.elapsed);
const lowest = joinedLexeme(known.lowest, further.lowest);
const highest = joinedLexeme(known.highest, further.highest);
const average = joinedLexeme(known.average, further.average);

/** Header text as plain words: folded, camel case and punctuation apart, CJK kept. */
export function wordsOf(text: string): string[] {
	const apart = text.replace(/([a-z])([A-Z])/g, '$1 $2');
	return foldWord(apart)
		.split(/[^\p{L}\p{N}#%+]+/u)
		.filter((word) => word !== '');
}

function says(words: readonly string[], text: string, lexeme: Lexeme): boolean {
	return (
		words.some((word) => lexeme.whole.includes(word) || lexeme.stems.some((stem) => word.startsWith(stem))) ||
		(lexeme.within ?? []).some((part) => text.includes(part))
	);
}

export interface HeaderMeaning {
	readonly quantity: Quantity | null;
	readonly isTime: boolean;
	readonly isElapsed: boolean;
	readonly isOtherClock: boolean;
	readonly isIndex: boolean;
	readonly isLimit: boolean;
	/** Words for the ends of a range, which only a figure that never moves makes limits. */
	readonly isBound: boolean;
	readonly statistic: 'min' | 'max' | 'mean' | null;
}

function quantityOf(words: readonly string[], text: string): Quantity | null {
	if (says(words, text, dewPoint)) return 'dew-point';
	if (says(words, text, derived)) return 'other';
	// "Temp/RH sensor" style heads name the temperature first; a percent sign settles it the other way.
	const isHumid = says(words, text, humidity);
	if (isHumid && (text.includes('%') || !says(words, text, temperature))) return 'humidity';
	if (says(words, text, temperature)) return 'temperature';
	if (says(words, text, light)) return 'light';
	if (says(words, text, shock)) return 'shock';
	return says(words, text, other) ? 'other' : null;
}

/** What a column head says about its column, in any of the languages known. */
export function meaningOf(header: string): HeaderMeaning {
	const text = foldWord(header);
	const words = wordsOf(header);
	const quantity = quantityOf(words, text);
	const isValue = quantity !== null;
	return {
		quantity,
		isTime: !isValue && says(words, text, time),
		isElapsed: !isValue && says(words, text, elapsed),
		isOtherClock: says(words, text, otherClock),
		isIndex: !isValue && says(words, text, index),
		isLimit: says(words, text, limit) || /\bset[ _-]?p(?:oin)?t\b/.test(text),
		isBound: says(words, text, bound),
		statistic: says(words, text, average)
			? 'mean'
			: says(words, text, lowest)
				? 'min'
				: says(words, text, highest)
					? 'max'
					: null
	};
}
