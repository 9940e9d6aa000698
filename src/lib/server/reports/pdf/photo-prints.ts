import type { Column, Content } from 'pdfmake/interfaces';
import type { Draft } from './draft';
import type { ReportPhoto } from './report-input';
import { sectionTitle } from './ledger';
import { hashLines } from './text';
import { figure, sentence, words } from './type-styles';

const across = 3;
const gapPoints = 10;
const highestPoints = 130;

/** The photographs themselves, three across, each with the hash of its file. */
export function photoPrints(draft: Draft): Content[] {
	const { photos } = draft.input;
	if (photos.length === 0) return [];
	const width = (draft.sheet.mainWidth - gapPoints * (across - 1)) / across;
	const rows: ReportPhoto[][] = [];
	for (let i = 0; i < photos.length; i += across) rows.push(photos.slice(i, i + across));
	return rows.map((row, i): Content => ({
		unbreakable: true,
		stack: [
			...(i === 0 ? [sectionTitle('Photographs', 'as they are kept, made smaller for paper')] : []),
			{
				columns: [...row.map((photo) => print(draft, photo, width)), { text: '', width: '*' }],
				columnGap: gapPoints,
				margin: [0, 6, 0, 0]
			}
		],
		margin: [0, i === 0 ? 14 : 4, 0, 0]
	}));
}

function print({ docket, calendar }: Draft, photo: ReportPhoto, width: number): Column {
	const told = docket.photos.find(({ id }) => id === photo.id);
	const caption = told === undefined ? '' : told.caption === '' ? told.kind : told.caption;
	const when = told === undefined ? '' : `${told.by}, ${calendar.day(told.at)} ${calendar.time(told.at)}`;
	return {
		width,
		stack: [
			{
				image: `data:image/jpeg;base64,${Buffer.from(photo.jpeg).toString('base64')}`,
				fit: [width, highestPoints]
			},
			words(caption, { margin: [0, 2, 0, 0] }),
			sentence(when),
			figure(hashLines(photo.sha256, 4), { size: 6.2 })
		]
	};
}
