import type { ContentText } from 'pdfmake/interfaces';
import type { Family } from './fonts';
import { palette, sizePoints } from './palette';
import { runsOf, sentenceRuns, type Run } from './runs';

interface Look {
	readonly size?: number;
	readonly color?: string;
	readonly bold?: boolean;
	readonly alignment?: 'left' | 'right' | 'center';
	readonly margin?: [number, number, number, number];
	readonly lineHeight?: number;
}

/** Mono draws larger than Barlow at one size; inside a sentence it steps back. */
const monoInSentence = 0.92;

function styled(runs: readonly Run[], family: Family, fallbackSize: number, look: Look): ContentText {
	const size = look.size ?? fallbackSize;
	// Each run carries its whole style: inside a longer text it would not inherit from here.
	const style = { color: look.color ?? palette.ink, bold: look.bold ?? false };
	return {
		text: runs.map((run) => ({
			text: run.text,
			font: run.font,
			fontSize: run.font === 'Mono' && family !== 'Mono' ? size * monoInSentence : size,
			...style
		})),
		font: family,
		fontSize: size,
		...style,
		...(look.alignment && { alignment: look.alignment }),
		...(look.margin && { margin: look.margin }),
		...(look.lineHeight && { lineHeight: look.lineHeight })
	};
}

/** Names and words as they were typed. */
export function words(text: string, look: Look = {}): ContentText {
	return styled(runsOf(text, 'Barlow'), 'Barlow', sizePoints.table, look);
}

/** Our own sentences: figures in mono. */
export function sentence(text: string, look: Look = {}): ContentText {
	return styled(sentenceRuns(text, 'Barlow'), 'Barlow', sizePoints.second, { color: palette.ink2, ...look });
}

/** Labels, units, table heads. */
export function label(text: string, look: Look = {}): ContentText {
	return styled(runsOf(text, 'Semi'), 'Semi', sizePoints.label, { color: palette.ink2, ...look });
}

/** Figures: mono, so that they line up. */
export function figure(text: string, look: Look = {}): ContentText {
	return styled(runsOf(text, 'Mono'), 'Mono', sizePoints.figure, look);
}
