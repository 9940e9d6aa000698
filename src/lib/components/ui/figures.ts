/** A run of a sentence: a figure is set in mono, words are not. */
export interface Run {
	text: string;
	isFigure: boolean;
}

const unit = '(?:d|h|min|s|%|°C|°F|K|°|B|KB|MB|GB)';

/*
 * What counts as a figure: anything with a decimal point, colon, slash or hyphen inside (12.4, 09:35, PS-26-1184), a signed
 * number, a long number (a GLN), and a number before a unit. A bare small number ("Dock 1", "3 lots") is a word.
 */
const figure = new RegExp(
	[
		'[\\w.-]+\\.(?:csv|txt|json|xml|pdf|zip)\\b',
		'\\d{2}/\\d{2}(?:/\\d{4})?(?:;[\\w:;,.]*\\w)?',
		'[A-Z]{2}-\\d{2}-\\d{3,}',
		'[A-Z]{1,3}-\\d[\\d-]*\\d',
		'[−±+]?\\d[\\d,]*(?:[.:]\\d+)+',
		'[−±+]\\d[\\d,]*',
		'\\d{4,}(?:-\\d{2}-\\d{2})?',
		`\\d[\\d,]*(?=\\s?${unit}(?![\\w-]))`,
		'[0-9a-f]{8}…[0-9a-f]{4}'
	].join('|'),
	'g'
);

const spaceBeforeUnit = new RegExp(`^ (?=${unit}(?![\\w-]))`);

/** Cuts a sentence into words and figures, losing nothing of it; the space before a unit does not break. */
export function figuresIn(sentence: string): Run[] {
	const runs: Run[] = [];
	let from = 0;
	for (const match of sentence.matchAll(figure)) {
		if (/[\p{L}\d/-]/u.test(sentence[match.index - 1] ?? '') && !/^[−±+]/.test(match[0])) continue;
		if (match.index > from) runs.push(wordsBetween(sentence.slice(from, match.index), runs.length > 0));
		runs.push({ text: match[0], isFigure: true });
		from = match.index + match[0].length;
	}
	if (from < sentence.length) runs.push(wordsBetween(sentence.slice(from), runs.length > 0));
	return runs;
}

function wordsBetween(text: string, isAfterFigure: boolean): Run {
	return { text: isAfterFigure ? text.replace(spaceBeforeUnit, '\u00a0') : text, isFigure: false };
}
