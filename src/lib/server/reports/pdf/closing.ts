import type { Content } from 'pdfmake/interfaces';
import { meaningWord } from './counterfoil-foot';
import type { Draft } from './draft';
import { ledger } from './ledger';
import { palette, sizePoints } from './palette';
import { label, sentence, words } from './type-styles';

/** About a third of a page in its column. */
const longWords = 1_000;

/** Names are printed with the fact they speak of, never a picture of handwriting. */
const caution =
	'An estimate of quality from temperature alone. It says nothing about pathogens, toxins (histamine, botulinum), contamination, ' +
	'freezing damage or physical injury, and it never overrides a food-safety limit, a HACCP plan, a medicine’s or vaccine’s ' +
	'stability data, or the decision of the responsible person or the authority. Claims deadlines are aids, not legal advice: ' +
	'contract and local law govern.';

/**
 * What was photographed and noted at the door; the pictures themselves stay with the record. Notes are the house's own,
 * and the report goes to the supplier: it says how many there are, and their words stay in the frozen record.
 */
export function photosAndNotes(draft: Draft): Content[] {
	const { docket, calendar } = draft;
	const when = (at: string) => `${calendar.day(at)} ${calendar.time(at)}`;
	const photos = docket.photos.map(
		(photo) =>
			[
				'photo',
				photo.caption === '' ? photo.kind : `${photo.caption} (${photo.kind})`,
				photo.by,
				when(photo.at)
			] as const
	);
	const condition = docket.arrival?.conditionNote ?? null;
	const atTheDoor =
		docket.arrival === null || condition === null
			? []
			: [['condition', condition, docket.arrival.loggedBy, when(docket.arrival.arrivedAt)] as const];
	const rows = [...atTheDoor, ...photos];
	const noted = notesKept(docket.notes.length);
	if (rows.length === 0) return noted;
	return [
		ledger({
			width: draft.sheet.mainWidth,
			title: 'Seen at the door',
			areRowsLong: rows.some(([, what]) => what.length > longWords),
			finding: photos.length === 0 ? null : 'every photo is kept with the record and in the evidence bundle',
			columns: [
				{ head: '', width: 44 },
				{ head: 'What', width: '*' },
				{ head: 'By', width: 76 },
				{ head: 'When', width: 80 }
			],
			rows: rows.map(([kind, what, by, at]) => [
				sentence(kind),
				words(what),
				words(by),
				sentence(at, { size: sizePoints.table, color: palette.ink })
			])
		}),
		...noted
	];
}

function notesKept(notes: number): Content[] {
	if (notes === 0) return [];
	const said = notes === 1 ? 'One internal note is' : `${notes} internal notes are`;
	return [sentence(`${said} kept with the record and not printed here.`, { margin: [0, 6, 0, 0] })];
}

/** Printed name, meaning, date and time with zone: the three things a signature must show. Source: 21 CFR 11.50(a). */
export function signatureStrip(draft: Draft): Content {
	const { signature } = draft.input;
	const { calendar, sheet } = draft;
	const zone = calendar.zoneName(signature.signedAt);
	const boxes = [
		['Signed by', signature.signedBy, signature.signedByTitle],
		['Meaning', meaningWord(signature.meaning), 'of the dispositions'],
		[
			'Date and time',
			`${calendar.date(signature.signedAt)}, ${calendar.timeToTheSecond(signature.signedAt)}`,
			`${zone}, ${calendar.offset(signature.signedAt)}`
		]
	] as const;
	const widths = [0.36, 0.28, 0.36].map((share) => share * (sheet.mainWidth - 30.5));
	return {
		unbreakable: true,
		stack: [
			{
				table: {
					widths,
					body: [
						boxes.map(([name, value, note]) => ({
							stack: [
								label(name),
								sentence(value, { size: 10.4, bold: true, color: palette.ink }),
								sentence(note)
							]
						}))
					]
				},
				layout: {
					hLineWidth: () => 1.1,
					hLineColor: () => palette.ink,
					vLineWidth: (i) => (i === 0 || i === boxes.length ? 0 : 0.6),
					vLineColor: () => palette.rule,
					paddingLeft: (i) => (i === 0 ? 0 : 7),
					paddingRight: () => 5,
					paddingTop: () => 6,
					paddingBottom: () => 6
				}
			},
			...(signature.amendmentReason === null
				? []
				: [
						sentence(`Version ${signature.version} amends an earlier one: ${signature.amendmentReason}`, {
							margin: [0, 6, 0, 0],
							color: palette.ink
						})
					]),
			sentence(caution, { size: 8, color: palette.ink, margin: [0, 7, 0, 0] })
		],
		margin: [0, 16, 0, 0]
	};
}
