import { draws, type Family } from './fonts';

export interface Run {
	readonly text: string;
	readonly font: Family;
}

const fallbacks: readonly Family[] = ['Barlow', 'Mono', 'Noto'];
const replacement = '\u{fffd}';
/** Controls, and the invisible marks that could make a name read otherwise than it is written. */
const unprintable = /(?!\n)[\p{Cc}\p{Cf}]/gu;
const numeral = /([−-]?\d[\d.,:]*\d|[−-]?\d)/u;

/** Text in the family's own letters, in a fallback's where it lacks them, else the replacement mark; never empty boxes. */
export function runsOf(text: string, family: Family): Run[] {
	const runs: { text: string; font: Family }[] = [];
	for (const character of printable(text)) {
		const next = drawn(character, family);
		const last = runs.at(-1);
		if (last !== undefined && last.font === next.font) last.text += next.text;
		else runs.push({ ...next });
	}
	return runs;
}

/** A sentence whose figures stand in mono, as everywhere in the product. */
export function sentenceRuns(text: string, family: Family): Run[] {
	return text.split(numeral).flatMap((part, i) => runsOf(part, i % 2 === 1 ? 'Mono' : family));
}

function printable(text: string): string {
	return text.replace(/\r\n?/gu, '\n').replace(/\t/gu, ' ').replace(unprintable, '').normalize('NFC');
}

function drawn(character: string, family: Family): Run {
	const codePoint = character.codePointAt(0) ?? 0;
	if (character === '\n' || draws(family, codePoint)) return { text: character, font: family };
	const other = fallbacks.find((candidate) => draws(candidate, codePoint));
	if (other !== undefined) return { text: character, font: other };
	return draws('Mono', 0xfffd) ? { text: replacement, font: 'Mono' } : { text: '?', font: family };
}
