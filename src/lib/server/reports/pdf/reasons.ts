import type { Content } from 'pdfmake/interfaces';
import type { Draft } from './draft';
import { sectionTitle } from './ledger';
import { palette, sizePoints } from './palette';
import { figure, sentence, words } from './type-styles';

/** The signer's own words first, then what the rules found, line by line. */
export function reasons(draft: Draft): Content[] {
	const { signature, reasonTexts } = draft.input;
	const own = signature.reasons.trim();
	const found = draft.docket.lines.flatMap((line) =>
		(reasonTexts[line.id] ?? []).map((text) => ({ line: line.ordinal, text }))
	);
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
				sectionTitle('Reasons', null),
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

function quoted(text: string, by: string): Content {
	const size = 10.2;
	return {
		text: [sentence(`“${text}” `, { size, color: palette.ink }), words(by, { size, color: palette.ink2 })],
		margin: [0, 8, 0, 3]
	};
}
