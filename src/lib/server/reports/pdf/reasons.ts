import type { Content } from 'pdfmake/interfaces';
import type { Draft } from './draft';
import { sectionTitle } from './ledger';
import { palette, sizePoints } from './palette';
import { figure, sentence, words } from './type-styles';

/** The signer's own words first, then what the rules found, line by line. */
export function reasons(draft: Draft): Content[] {
	const { signature, reasonTexts } = draft.input;
	const own = signature.reasons.trim();
	const found = draft.docket.lines.flatMap((line) => {
		const texts = reasonTexts[line.id] ?? [];
		const recommended = line.recommendation?.recommended;
		const word = recommended === undefined ? '' : `${recommended} recommended. `;
		return texts.map((text, i) => ({
			line: line.ordinal,
			text: i === 0 ? upperFirst(`${word}${text}`) : text
		}));
	});
	if (own === '' && found.length === 0) return [];
	const items = found.map(({ line, text }, i): Content => ({
		columns: [
			{ ...figure(`${i + 1}.`, { color: palette.ink2 }), width: 18 },
			{
				...sentence(draft.docket.lines.length > 1 ? `Line ${line}: ${text}` : text, {
					size: sizePoints.table,
					color: palette.ink
				}),
				width: '*'
			}
		],
		margin: [0, 1.6, 0, 0]
	}));
	return [
		{
			unbreakable: own.length < 600,
			stack: [
				sectionTitle('Reasons', 'the signer’s words, then what the rules found'),
				{
					canvas: [
						{
							type: 'line',
							x1: 0,
							y1: 4,
							x2: draft.sheet.mainWidth,
							y2: 4,
							lineWidth: 1.1,
							lineColor: palette.ink
						}
					]
				},
				...(own === '' ? [] : [quoted(own, signature.signedBy)])
			],
			margin: [0, 16, 0, 4]
		},
		...items
	];
}

function upperFirst(text: string): string {
	return text.charAt(0).toUpperCase() + text.slice(1);
}

function quoted(text: string, by: string): Content {
	const size = 10.2;
	return {
		text: [sentence(`“${text}” `, { size, color: palette.ink }), words(by, { size, color: palette.ink2 })],
		margin: [0, 8, 0, 3]
	};
}
