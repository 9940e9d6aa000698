import type { Content } from 'pdfmake/interfaces';
import type { Draft } from './draft';
import { sectionTitle } from './ledger';
import { palette, sizePoints } from './palette';
import { sentence } from './type-styles';

/** Three checks, from the one anybody can do to the one that needs nobody's word. */
export function howToVerify(draft: Draft): Content {
	const { input, docket } = draft;
	const { host } = new URL(input.verifyAddress);
	const code = input.verifyAddress.split('/').at(-1) ?? '';
	const steps = [
		`Is it current? Scan the square on page 1, or open ${host}/verify and type ${code}. The page also takes the PDF itself, which it does not send anywhere.`,
		`Is it whole? A reader that shows signatures says that the document was signed by ${input.organisation} and not changed since. Bytes added later are shown as not signed.`,
		`Do the figures stand? The exports are attached inside as they came${docket.loggers.length === 0 ? '' : ', with the readings taken from them as CSV'}. The SHA-256 of each stands in the table of loggers.`
	];
	return {
		unbreakable: true,
		stack: [
			sectionTitle('How to verify this report', null),
			...steps.map((step): Content =>
				sentence(step, { size: sizePoints.table, color: palette.ink, margin: [0, 2.5, 0, 0] })
			)
		],
		margin: [0, 14, 0, 0]
	};
}
