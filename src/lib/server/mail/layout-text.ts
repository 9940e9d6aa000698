import type { MailContent } from './layout';

const lineLength = 72;

/** Breaks a paragraph at spaces; a word longer than a line, such as an address, stays whole. */
export function wrapped(text: string, length = lineLength): string {
	const lines: string[] = [''];
	for (const word of text.split(/\s+/)) {
		const line = lines.at(-1) ?? '';
		if (line && line.length + 1 + word.length > length) lines.push(word);
		else lines[lines.length - 1] = line ? `${line} ${word}` : word;
	}
	return lines.join('\n');
}

function columns(rows: readonly { label: string; value: string }[]): string {
	const width = Math.max(...rows.map(({ label }) => label.length)) + 3;
	return rows.map(({ label, value }) => label.padEnd(width) + value).join('\n');
}

/** The plain-text part, with the same figures. */
export function textOf(content: MailContent): string {
	const { facts, outcomes = [], button } = content;
	return [
		content.title.toUpperCase(),
		content.kicker,
		'',
		content.greeting,
		...content.paragraphs.flatMap((text) => ['', wrapped(text)]),
		...(facts.length > 0 ? ['', columns(facts)] : []),
		...(outcomes.length > 0
			? ['', columns(outcomes.map(({ name, words }) => ({ label: name, value: words })))]
			: []),
		'',
		`${button.word}:`,
		button.href,
		...content.after.flatMap((text) => ['', wrapped(text)]),
		'',
		'-- ',
		wrapped(content.foot),
		''
	].join('\n');
}
