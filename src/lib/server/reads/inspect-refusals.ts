import type { RefusalCode } from '../../domain/ingest/ingestion';
import type { InspectRefusalCode } from '../../schemas/inspect';

/** What other programs are told; the sentence beside it keeps the finer difference. */
const codes: Readonly<Record<RefusalCode, InspectRefusalCode>> = {
	empty: 'empty',
	'too-large': 'too-large',
	'too-many-readings': 'too-large',
	spreadsheet: 'not-text',
	pdf: 'not-text',
	zip: 'not-text',
	image: 'not-text',
	binary: 'not-text',
	xml: 'not-text',
	'broken-gzip': 'not-text',
	html: 'web-page',
	'header-only': 'no-readings',
	'no-readings': 'no-readings',
	'no-temperature': 'no-temperature',
	'no-time': 'no-time',
	'one-reading': 'no-time-progress',
	'no-time-progress': 'no-time-progress',
	'broken-json': 'json-syntax',
	truncated: 'truncated',
	'unclosed-quote': 'unclosed-quote',
	'two-recordings': 'two-recordings',
	'implausible-dates': 'implausible-dates',
	'too-deep': 'too-deep',
	'line-too-long': 'line-too-long',
	'too-many-columns': 'line-too-long'
};

/** The published code of a refusal. */
export function inspectRefusal(code: RefusalCode): InspectRefusalCode {
	return codes[code];
}
