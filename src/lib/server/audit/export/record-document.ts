import pdfmake from 'pdfmake';
import { auditDetails, auditSubjectWords, auditText } from '../../../messages/en/audit-events';
import type { AuditQuery } from '../../../schemas/audit-list';
import { fontFiles } from '../../reports/pdf/fonts';
import { ledger } from '../../reports/pdf/ledger';
import { houseMark } from '../../reports/pdf/marks';
import { palette, sizePoints } from '../../reports/pdf/palette';
import { calendar } from '../../reports/pdf/text';
import { figure, sentence, words } from '../../reports/pdf/type-styles';
import type { AuditEntryView } from '../list-entries';

/** What a printed record is made from. */
export interface RecordOrder {
	readonly entries: readonly AuditEntryView[];
	readonly query: AuditQuery;
	readonly zone: string;
	readonly organisation: string;
	readonly madeAt: string;
	readonly madeBy: string;
}

const ownFonts = new Set(Object.values(fontFiles).flatMap((files) => [files.normal, files.bold]));
const margin = 34;
const mainWidth = 841.89 - 2 * margin;

function whoOf({ actorKind, actorName }: AuditEntryView): string {
	if (actorKind === 'system') return 'the program';
	return `${actorName ?? 'somebody'}${actorKind === 'link' ? ', by link' : ''}`;
}

function filterOf({ about, docket, from, to, by }: AuditQuery): string {
	return [
		about === 'any' ? 'every kind of entry' : (auditSubjectWords[about] ?? about),
		docket && `docket ${docket}`,
		from && `from ${from}`,
		to && `to ${to}`,
		by && 'by one actor'
	]
		.filter(Boolean)
		.join(', ');
}

function rowOf(entry: AuditEntryView, { date, timeToTheSecond }: ReturnType<typeof calendar>) {
	const facts = auditDetails(entry.payload)
		.map(({ label, value }) => `${label} ${value}`)
		.join('; ');
	const contents = entry.payload === null ? 'contents taken out by retention' : facts;
	return [
		figure(`${date(entry.occurredAt)}\n${timeToTheSecond(entry.occurredAt)}`),
		{
			stack: [
				words(auditText(entry.type, entry.payload), { bold: true }),
				...(contents === '' ? [] : [words(contents, { size: sizePoints.second, color: palette.ink2 })])
			]
		},
		words(`${whoOf(entry)}\n${entry.address}`, { size: sizePoints.second }),
		words(entry.about ?? 'the register'),
		figure(String(entry.seq)),
		figure(entry.sha256.slice(0, 16), { size: sizePoints.smallest })
	];
}

/** The audit trail, or what a filter leaves of it, as a PDF in the look of the report; A4 across. */
export async function recordDocument(order: RecordOrder): Promise<Uint8Array> {
	pdfmake.setUrlAccessPolicy(() => false);
	pdfmake.setLocalAccessPolicy((path) => ownFonts.has(path));
	pdfmake.setFonts({ ...fontFiles });
	const { entries, zone, organisation, madeAt, madeBy } = order;
	const times = calendar(zone);
	const made = `${times.date(madeAt)}, ${times.timeToTheSecond(madeAt)} ${times.zoneName(madeAt)}`;
	return pdfmake
		.createPdf({
			pageSize: 'A4',
			pageOrientation: 'landscape',
			pageMargins: [margin, 62, margin, 44],
			version: '1.7',
			tagged: true,
			displayTitle: true,
			language: 'en',
			info: {
				title: `Audit trail of ${organisation}`,
				author: organisation,
				creator: 'Wharfinger',
				producer: 'Wharfinger',
				creationDate: new Date(madeAt)
			},
			defaultStyle: { font: 'Barlow', fontSize: sizePoints.table, lineHeight: 1.05 },
			header: (page, pages) => ({
				margin: [margin, 24, margin, 0],
				columns: [
					{ ...houseMark(13), width: 19 },
					{ ...words('Wharfinger', { size: 11.2, bold: true, color: palette.tar }), width: 90 },
					{ ...words(`Audit trail of ${organisation}`, { bold: true }), width: '*' },
					{ ...sentence(`page ${page} of ${pages}`, { size: 9, alignment: 'right' }), width: 90 }
				]
			}),
			footer: () => ({
				margin: [margin, 10, margin, 0],
				...sentence(
					`Taken by ${madeBy}, ${made}. All times ${zone}. An entry's hash covers its contents and the hash before it; the first sixteen digits stand here, all of them in the CSV.`
				)
			}),
			content: [
				ledger({
					title: 'Record',
					finding: `${entries.length} ${entries.length === 1 ? 'entry' : 'entries'}, newest first: ${filterOf(order.query)}`,
					columns: [
						{ head: 'When', width: 66 },
						{ head: 'What happened', width: '*' },
						{ head: 'By, from', width: 118 },
						{ head: 'About', width: 96 },
						{ head: 'Entry', width: 34, align: 'right' },
						{ head: 'Hash', width: 84 }
					],
					rows: entries.map((entry) => rowOf(entry, times)),
					width: mainWidth,
					areRowsLong: true
				})
			]
		})
		.getBuffer();
}
