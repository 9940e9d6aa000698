import type { Content } from 'pdfmake/interfaces';
import { meaningWord } from './counterfoil-foot';
import type { Draft } from './draft';
import { houseMark } from './marks';
import { palette } from './palette';
import { sentence, words } from './type-styles';

/** Mark and word-mark, what it is, which page: the head of every page's main column. */
export function runningHead(draft: Draft, page: number, pages: number): Content {
	const { left, mainWidth } = draft.sheet;
	const number = `${draft.docket.number}, version ${draft.input.signature.version}`;
	const middle = words('Receiving report  ', { bold: true });
	return {
		absolutePosition: { x: left, y: 23 },
		stack: [
			{
				columns: [
					{ ...houseMark(13), width: 19 },
					{
						...words('Wharfinger', { size: 11.2, bold: true, color: palette.tar }),
						width: 90,
						characterSpacing: -0.13
					},
					{
						text: [middle, sentence(number, { size: 9, color: palette.ink })],
						width: mainWidth - 179,
						alignment: 'center'
					},
					{ ...sentence(`page ${page} of ${pages}`, { size: 9 }), width: 70, alignment: 'right' }
				]
			},
			{
				canvas: [{ type: 'line', x1: 0, y1: 5, x2: mainWidth, y2: 5, lineWidth: 1.1, lineColor: palette.ink }]
			}
		]
	};
}

/** Site, GLN, zone, and what is sealed in the file. */
export function runningFoot(draft: Draft): Content {
	const { sheet, docket, calendar, input } = draft;
	const at = input.signature.signedAt;
	const name = calendar.zoneName(at);
	const zone = name === docket.site.zone ? name : `${docket.site.zone} (${name})`;
	const attached = input.attachments.length;
	const exports =
		attached === 0 ? '' : `; ${attached === 1 ? 'one file is' : `${attached} files are`} attached inside`;
	const place = [docket.site.name, docket.dock].filter(Boolean).join(', ');
	const { signature } = input;
	const meaning = meaningWord(signature.meaning).toLowerCase();
	const signed = `Signed by ${signature.signedBy}, ${meaning}, ${calendar.date(at)}, ${calendar.timeToTheSecond(at)} ${name} (${calendar.offset(at)}). `;
	const text =
		`${place}${docket.site.gln === null ? '' : `, GLN ${docket.site.gln}`}. All times ${zone}, ${calendar.offset(at)} at signing. ` +
		`Sealed with the certificate of ${input.organisation}${exports}.`;
	return {
		absolutePosition: { x: sheet.left, y: sheet.height - sheet.bottom + 8 },
		stack: [
			{
				canvas: [
					{ type: 'line', x1: 0, y1: 0, x2: sheet.mainWidth, y2: 0, lineWidth: 0.6, lineColor: palette.rule }
				]
			},
			{
				columns: [
					{
						// Name, time and meaning on every page: a copied sheet is a record too. Source: 21 CFR 11.50(b).
						stack: [
							sentence(signed, { size: 7.6, color: palette.ink, margin: [0, 4, 0, 0] }),
							sentence(text, { size: 7.6 })
						],
						width: sheet.mainWidth
					}
				]
			}
		]
	};
}

/** The dotted cut between record and counterfoil, from edge to edge. */
export function cutLine(draft: Draft): Content {
	const { cut, height } = draft.sheet;
	const dots = { length: 0.01, space: 2.6 };
	return {
		absolutePosition: { x: 0, y: 0 },
		canvas: [
			{
				type: 'line',
				x1: cut,
				y1: 1,
				x2: cut,
				y2: height,
				lineWidth: 1.3,
				lineColor: palette.edge,
				lineCap: 'round',
				dash: dots
			}
		]
	};
}
