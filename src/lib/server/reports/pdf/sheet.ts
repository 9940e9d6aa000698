import type { ReportInput } from './report-input';

const pointsPerMillimetre = 72 / 25.4;
const marginMillimetres = 10;
const counterfoilMillimetres = 44;
/** Standard page sizes in points, as the PDF writer knows them. */
const sizes = { a4: ['A4', 595.28, 841.89], letter: ['LETTER', 612, 792] } as const;

/** Where things stand on a page, in points from its top left corner. */
export interface Sheet {
	readonly name: 'A4' | 'LETTER';
	readonly width: number;
	readonly height: number;
	readonly left: number;
	readonly mainWidth: number;
	/** The dotted line between record and counterfoil. */
	readonly cut: number;
	readonly stubLeft: number;
	readonly stubWidth: number;
	readonly top: number;
	readonly bottom: number;
	/** The box on page one that says who signed; the signature field lies over it. */
	readonly sealTop: number;
	readonly sealHeight: number;
	readonly qrTop: number;
	readonly qrSize: number;
}

/** Geometry of the chosen page size: main column left, counterfoil 44 mm on the right. */
export function sheetOf(pageSize: ReportInput['pageSize']): Sheet {
	const [name, width, height] = sizes[pageSize];
	const left = marginMillimetres * pointsPerMillimetre;
	const cut = width - counterfoilMillimetres * pointsPerMillimetre;
	const stubLeft = cut + 17;
	const qrSize = 74;
	const qrTop = height - 62 - qrSize;
	const sealHeight = 72;
	return {
		name,
		width,
		height,
		left,
		cut,
		mainWidth: cut - 15 - left,
		stubLeft,
		stubWidth: width - 16 - stubLeft,
		top: 56,
		bottom: 56,
		sealTop: qrTop - 14 - sealHeight,
		sealHeight,
		qrTop,
		qrSize
	};
}
