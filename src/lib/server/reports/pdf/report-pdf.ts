import pdfmake from 'pdfmake';
import type { Content, TDocumentDefinitions } from 'pdfmake/interfaces';
import { chapterContent } from './chapters';
import { photosAndNotes, signatureStrip } from './closing';
import { howToVerify } from './how-to-verify';
import { otherExcursions } from './excursions-ledger';
import { otherLegs } from './other-legs-ledger';
import { photoPrints } from './photo-prints';
import { pulpLedger } from './pulp-ledger';
import { firstCounterfoil } from './counterfoil';
import { firstCounterfoilFoot, laterCounterfoil, verticalNumber } from './counterfoil-foot';
import { dispositions } from './dispositions';
import { docketHead } from './docket-head';
import { draftOf, type Draft } from './draft';
import { fontFiles } from './fonts';
import { loggers } from './loggers-ledger';
import { sizePoints } from './palette';
import { reasons } from './reasons';
import { embeddedFiles } from './embedded-files';
import type { ReportInput } from './report-input';
import { restsOn } from './rests-on';
import { signedBefore } from './signed-before';
import { tagContent } from './tag-content';
import { cutLine, runningFoot, runningHead } from './running';

const ownFonts = new Set(Object.values(fontFiles).flatMap((files) => [files.normal, files.bold]));

/** Nothing is fetched, and no file is opened but the fonts. */
pdfmake.setUrlAccessPolicy(() => false);
pdfmake.setLocalAccessPolicy((path) => ownFonts.has(path));
pdfmake.setFonts({ ...fontFiles });
tagContent();

/** The receiving report as PDF bytes; the same input gives the same bytes. */
export async function reportPdf(input: ReportInput): Promise<Uint8Array> {
	return pdfmake.createPdf(documentOf(draftOf(input))).getBuffer();
}

function documentOf(draft: Draft): TDocumentDefinitions {
	const { sheet, input, docket } = draft;
	return {
		pageSize: sheet.name,
		pageMargins: [sheet.left, sheet.top, sheet.width - sheet.left - sheet.mainWidth, sheet.bottom],
		version: '1.7',
		subset: 'PDF/A-3b',
		tagged: true,
		displayTitle: true,
		language: 'en',
		info: {
			title: `Receiving report ${docket.number}, version ${input.signature.version}`,
			author: input.organisation,
			subject: `${docket.supplier.name} to ${docket.site.name}`,
			creator: 'Wharfinger',
			producer: 'Wharfinger',
			creationDate: new Date(input.creationAt),
			modDate: new Date(input.creationAt)
		},
		files: embeddedFiles(input),
		defaultStyle: { font: 'Barlow', fontSize: sizePoints.table, lineHeight: 1.05 },
		background: (page) => ({ stack: pageFrame(draft, page) }),
		header: (page, pages) => runningHead(draft, page, pages),
		content: body(draft)
	};
}

function body(draft: Draft): Content[] {
	const charted = draft.chapters.filter(({ hasChart }) => hasChart);
	const others = draft.chapters.filter(({ hasChart }) => !hasChart);
	return [
		...docketHead(draft),
		...dispositions(draft),
		...charted.flatMap((chapter) => chapterContent(draft, chapter)),
		...(others.length === 0 ? [] : [...otherExcursions(draft, others), ...otherLegs(draft, others)]),
		...reasons(draft),
		...restsOn(draft),
		...loggers(draft),
		...pulpLedger(draft),
		...photosAndNotes(draft),
		...photoPrints(draft),
		...signedBefore(draft),
		signatureStrip(draft),
		howToVerify(draft)
	];
}

/** What stands on every page outside the main column; only a background has the whole page's height to stand in. */
function pageFrame(draft: Draft, page: number): Content[] {
	const { sheet } = draft;
	const stub = (content: Content[]): Content => ({
		absolutePosition: { x: sheet.stubLeft, y: 26 },
		columns: [{ stack: content, width: sheet.stubWidth }]
	});
	const counterfoil =
		page === 1
			? [stub(firstCounterfoil(draft)), ...firstCounterfoilFoot(draft)]
			: [stub(laterCounterfoil(draft)), verticalNumber(draft)];
	return [cutLine(draft), runningFoot(draft), ...counterfoil];
}
