import { htmlOf } from './layout-html';
import { textOf } from './layout-text';

export type MailMark = 'accept' | 'conditions' | 'hold' | 'reject';

/** What a mail says, whatever it is about; both of its parts are made from this and so say the same. */
export interface MailContent {
	/** Who writes about what: "Pell Staithe · notice N-26-0212". */
	kicker: string;
	title: string;
	greeting: string;
	paragraphs: readonly string[];
	/** About six rows. */
	facts: readonly { label: string; value: string; isFigure?: boolean }[];
	/** What became of each line, where there are lines. */
	outcomes?: readonly { mark: MailMark; name: string; words: string }[];
	/** The one act. Its address stands below in full too, for those whose button does nothing. */
	button: { word: string; href: string };
	after: readonly string[];
	foot: string;
}

/** The HTML and the plain-text part of a mail. No image, web font or style sheet: it reads the same everywhere. */
export function renderMail(content: MailContent): { html: string; text: string } {
	return { html: htmlOf(content), text: textOf(content) };
}
