import type { Content } from 'pdfmake/interfaces';
import type { Draft } from './draft';
import { ledger } from './ledger';
import { palette, sizePoints } from './palette';
import { sentence, words } from './type-styles';

/** About a third of a page in its column. */
const longWords = 1_000;

/**
 * What others signed before the decision and it rests on: reviews of the same decision, and determinations of a
 * qualified person; each with name, meaning, date and time. Source: 21 CFR 11.50(a).
 */
export function signedBefore(draft: Draft): Content[] {
	const { reviews = [], determinations = [] } = draft.input.frozen;
	const { calendar, sheet } = draft;
	const when = (at: string) =>
		`${calendar.date(at)}, ${calendar.timeToTheSecond(at)} ${calendar.zoneName(at)}`;
	const rows = [
		...reviews.map(({ by, title, at, reasons }) => ({ by, title, at, meaning: 'review', text: reasons })),
		...determinations.map(({ by, title, at, text }) => ({ by, title, at, meaning: 'determination', text }))
	];
	if (rows.length === 0) return [];
	return [
		ledger({
			width: sheet.mainWidth,
			title: 'Signed before',
			finding: 'of the same decision, on the same evidence',
			areRowsLong: rows.some(({ text }) => text.length > longWords),
			columns: [
				{ head: 'By', width: 96 },
				{ head: 'Meaning', width: 66 },
				{ head: 'What was written', width: '*' },
				{ head: 'When', width: 96 }
			],
			rows: rows.map(({ by, title, meaning, text, at }) => [
				words(title === '' ? by : `${by}, ${title}`),
				sentence(meaning),
				words(text === '' ? 'no remark' : text),
				sentence(when(at), { size: sizePoints.table, color: palette.ink })
			])
		})
	];
}
