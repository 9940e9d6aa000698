import type { Content } from 'pdfmake/interfaces';
import { attributes, textElement } from './chart/svg';
import { widthOf } from './chart/words-room';
import { counterfoilTop, hairline, pair } from './counterfoil-parts';
import type { Draft } from './draft';
import { overUseOf } from './leg-figures';
import { palette, sizePoints } from './palette';
import { hashLines } from './text';
import { figure, label, sentence, words } from './type-styles';

const meanings = { approval: 'Approval', review: 'Review', authorship: 'Authorship' } as const;

export function meaningWord(meaning: keyof typeof meanings): string {
	return meanings[meaning];
}

/** Who signed, under the signature field, and the code that asks whether this is genuine and current. */
export function firstCounterfoilFoot(draft: Draft): Content[] {
	const { sheet, input } = draft;
	const { signature } = input;
	const at = signature.signedAt;
	const position = (y: number) => ({ absolutePosition: { x: sheet.stubLeft, y } });
	const fixed = (content: Content[]): Content => ({ columns: [{ stack: content, width: sheet.stubWidth }] });
	const signed: Content[] = [
		hairline(sheet.stubWidth, 0),
		label('Signed'),
		words(signature.signedBy, { size: 10, bold: true, margin: [0, 1, 0, 0] }),
		words(meanings[signature.meaning], { size: sizePoints.second, margin: [0, 1, 0, 0] }),
		sentence(draft.calendar.at(at).toFormat('ccc d LLL yyyy'), { color: palette.ink }),
		sentence(`${draft.calendar.timeToTheSecond(at)} ${draft.calendar.zoneName(at)}`, { color: palette.ink })
	];
	const check: Content[] = [
		sentence('Genuine? Still current?', { size: sizePoints.smallest }),
		sentence(breakable(input.verifyAddress), { size: sizePoints.smallest })
	];
	return [
		{ stack: [fixed(signed)], ...position(sheet.sealTop) },
		{
			qr: input.verifyAddress,
			fit: sheet.qrSize,
			foreground: palette.ink,
			eccLevel: 'M',
			...position(sheet.qrTop)
		},
		{ stack: [fixed(check)], ...position(sheet.qrTop + sheet.qrSize + 4) }
	];
}

/** Lines may turn after a slash; the code carries the address unbroken. */
function breakable(address: string): string {
	return address.replace(/^https?:\/\//u, '').replace(/\/(?=.)/gu, '/\n');
}

/** Later pages' counterfoil: over-use, hash, versions. */
export function laterCounterfoil(draft: Draft): Content[] {
	const { sheet, input } = draft;
	const { signature } = input;
	const amended =
		signature.amendmentReason === null
			? []
			: [sentence(shortened(signature.amendmentReason), { color: palette.ink })];
	return [
		...counterfoilTop(draft),
		...overUse(draft),
		label('SHA-256 of this record'),
		figure(hashLines(signature.frozenSha256, 2), { size: sizePoints.smallest, margin: [0, 3, 0, 0] }),
		hairline(sheet.stubWidth, 9),
		label('Versions'),
		sentence(`${signature.version}  ${draft.calendar.date(signature.signedAt)}, current at printing`, {
			color: palette.ink,
			margin: [0, 3, 0, 0]
		}),
		...amended
	];
}

/** The counterfoil is narrow and one page high; the whole reason stands beside the signature. */
function shortened(text: string): string {
	return text.length <= 120 ? text : `${text.slice(0, 110).trimEnd()} …, whole at the end`;
}

function overUse(draft: Draft): Content[] {
	const lead = draft.chapters[0];
	const over = lead === undefined ? null : overUseOf(lead.assessment.legs);
	if (lead === undefined || over === null) return [];
	const hours = (text: string): Content => ({ text: [figure(text), label(' h', { color: palette.ink })] });
	const width = draft.sheet.stubWidth * 0.8;
	return [
		label(`Over-use, all legs, ${lead.assessment.logger}`),
		{
			text: [figure(over.over, { size: sizePoints.life }), label(' h', { size: 12, color: palette.ink })],
			characterSpacing: -1.1
		},
		pair('Too warm', hours(over.tooWarm), width),
		pair('Too late', hours(over.tooLate), width),
		hairline(draft.sheet.stubWidth, 6)
	];
}

/** The number down the edge of later pages, so that a loose sheet finds its record. */
export function verticalNumber(draft: Draft): Content {
	const size = 19;
	const length = Math.ceil(widthOf(draft.docket.number, 'Mono', size)) + 4;
	const view = attributes({ viewBox: `0 0 22 ${length}`, width: 22, height: length });
	const text = textElement(4, 2, draft.docket.number, {
		family: 'Mono',
		size,
		color: palette.ink,
		turn: 90
	});
	return {
		svg: `<svg ${view}>${text}</svg>`,
		width: 22,
		height: length,
		absolutePosition: { x: draft.sheet.stubLeft, y: draft.sheet.height - length - 28 }
	};
}
