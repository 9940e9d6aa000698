/** A piece of a row, marked where the file is ambiguous. */
export interface Piece {
	text: string;
	isMarked: boolean;
}

/** Cuts a row at its marks, losing nothing of it; marks that overlap or leave the row are cut to fit. */
export function cutByMarks(text: string, marks: readonly { from: number; to: number }[]): Piece[] {
	const pieces: Piece[] = [];
	let at = 0;
	for (const mark of [...marks].sort((a, b) => a.from - b.from)) {
		const from = Math.max(at, mark.from);
		const to = Math.min(text.length, mark.to);
		if (to <= from) continue;
		if (from > at) pieces.push({ text: text.slice(at, from), isMarked: false });
		pieces.push({ text: text.slice(from, to), isMarked: true });
		at = to;
	}
	if (at < text.length || pieces.length === 0) pieces.push({ text: text.slice(at), isMarked: false });
	return pieces;
}

/** The same for the first place a subject stands at in a sentence. */
export function cutBySubject(sentence: string, subject: string): Piece[] {
	const from = subject === '' ? -1 : sentence.indexOf(subject);
	return cutByMarks(sentence, from < 0 ? [] : [{ from, to: from + subject.length }]);
}
