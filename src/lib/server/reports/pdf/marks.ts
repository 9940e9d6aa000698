import type { ContentSvg } from 'pdfmake/interfaces';
import type { Outcome } from '../../../domain/receiving/recommendation';
import type { DocketView, Verdict } from '../../../schemas/docket';
import { partQuantities } from '../../../domain/receiving/quantities';
import { partText } from '../../../messages/en/line-groups';
import { palette } from './palette';

const tick = '<path d="M5 10.4L8.6 14L15 6.6" fill="none"';
/** Each mark keeps its meaning in black and white: filled square, open square with a bar, two bars, cross. */
const drawings: Record<Outcome, string> = {
	accept: `<rect x="1" y="1" width="18" height="18" fill="${palette.kelp}"/>${tick} stroke="${palette.sheet}" stroke-width="2.4"/>`,
	conditions:
		`<rect x="2" y="2" width="16" height="16" fill="none" stroke="${palette.kelp}" stroke-width="2"/>` +
		`<path d="M5.4 8.6L8.6 11.6L14.6 5.4" fill="none" stroke="${palette.kelp}" stroke-width="2"/>` +
		`<path d="M5.4 14.8H14.6" fill="none" stroke="${palette.kelp}" stroke-width="1.8"/>`,
	hold: `<rect x="3" y="2" width="5" height="16" fill="${palette.rope}"/><rect x="12" y="2" width="5" height="16" fill="${palette.rope}"/>`,
	reject: `<path d="M3 3L17 17M17 3L3 17" fill="none" stroke="${palette.hull}" stroke-width="3.4"/>`
};

/** A verdict as printed. */
interface VerdictPrint {
	readonly mark: Outcome | null;
	readonly word: string;
}

const outcomeWords: Record<Outcome, string> = {
	accept: 'Accept',
	conditions: 'Accept with conditions',
	hold: 'Hold',
	reject: 'Reject'
};
const verdicts: Record<Exclude<Verdict, 'part'>, VerdictPrint> = {
	accepted: { mark: 'accept', word: 'Accepted' },
	conditions: { mark: 'conditions', word: 'Accepted with\u00a0conditions' },
	rejected: { mark: 'reject', word: 'Rejected' }
};

/** The mark of an outcome, always printed with its word beside it. */
export function outcomeMark(outcome: Outcome, sizePoints: number): ContentSvg {
	return {
		svg: `<svg viewBox="0 0 20 20">${drawings[outcome]}</svg>`,
		width: sizePoints,
		height: sizePoints
	};
}

export function outcomeWord(outcome: Outcome): string {
	return outcomeWords[outcome];
}

/** No tick stands over a part: its quantities say it. A docket that is signed but still held has no verdict yet. */
export function verdictOf({ verdict, lines }: Pick<DocketView, 'verdict' | 'lines'>): VerdictPrint {
	if (verdict === null) return { mark: 'hold', word: 'On hold' };
	if (verdict !== 'part') return verdicts[verdict];
	return { mark: null, word: partText(partQuantities(lines)) };
}

/** Bollard parted by an indented cut. */
export function houseMark(sizePoints: number): ContentSvg {
	const path = 'M0 1H24V5.8L18 14L12 5.8L6 14L0 5.8Z M3 14.3L6 18.4L12 10.2L18 18.4L21 14.3V23H3Z';
	return {
		svg: `<svg viewBox="0 0 24 24"><path d="${path}" fill="${palette.tar}"/></svg>`,
		width: sizePoints,
		height: sizePoints
	};
}
