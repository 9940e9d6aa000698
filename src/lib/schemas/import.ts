import { z } from 'zod';

export const maxImportBytes = 2_000_000;
export const maxImportRows = 2_000;

/** The columns of an advance notice, as the template has them; several rows with one load name are its lines. */
export const importColumns = [
	{
		name: 'load',
		isNeeded: true,
		note: 'your name for the load; rows with the same one are its lines',
		sample: 'W14-01'
	},
	{ name: 'supplier', isNeeded: true, note: 'name or GLN, as under Partners', sample: '' },
	{ name: 'carrier', isNeeded: false, note: 'name or GLN', sample: '' },
	{
		name: 'order',
		isNeeded: false,
		note: 'purchase order; this or the waybill is needed',
		sample: '450-1184'
	},
	{ name: 'waybill', isNeeded: false, note: 'bill of lading or CMR', sample: 'CMR 118402' },
	{ name: 'mode', isNeeded: false, note: 'road, sea, air or rail; road when blank', sample: 'road' },
	{ name: 'trailer', isNeeded: false, note: '', sample: 'AR-4471' },
	{ name: 'seal', isNeeded: false, note: '', sample: '0093187' },
	{ name: 'dock', isNeeded: false, note: '', sample: '' },
	{ name: 'due', isNeeded: true, note: 'by the site’s clock, 2026-04-03 05:30', sample: '2026-04-03 05:30' },
	{
		name: 'loaded',
		isNeeded: false,
		note: 'when the carrier takes over, planned',
		sample: '2026-04-01 20:00'
	},
	{ name: 'setpoint', isNeeded: false, note: 'of the carrier, in °C', sample: '0.5' },
	{ name: 'product', isNeeded: true, note: 'name, as under Specs', sample: '' },
	{ name: 'lot', isNeeded: true, note: '', sample: 'OB-26089-1' },
	{ name: 'gtin', isNeeded: false, note: '8, 12, 13 or 14 digits', sample: '9506000134352' },
	{ name: 'ssccs', isNeeded: false, note: 'pallet labels, apart by spaces', sample: '106141412345678908' },
	{ name: 'cases', isNeeded: true, note: '', sample: '960' },
	{ name: 'pallets', isNeeded: false, note: '', sample: '5' },
	{ name: 'value', isNeeded: false, note: 'of the line', sample: '13824.00' },
	{ name: 'currency', isNeeded: false, note: 'three letters; the site’s when blank', sample: 'EUR' },
	{ name: 'best before', isNeeded: false, note: '2026-04-18', sample: '2026-04-18' },
	{ name: 'used hours', isNeeded: false, note: 'life used before loading, as declared', sample: '20' },
	{ name: 'used basis', isNeeded: false, note: 'what that rests on', sample: 'harvest to pre-cool' },
	{
		name: 'loggers',
		isNeeded: false,
		note: 'serials riding with the line, apart by spaces',
		sample: 'LG-20417'
	}
] as const;
export type ImportColumn = (typeof importColumns)[number]['name'];

/** The text of the file, which the preview hands on to the import: nothing is kept in between. */
export const importForm = z.object({
	text: z
		.string({ error: 'Choose a file first.' })
		.max(maxImportBytes, 'The file is larger than 2 MB. Send it in parts.'),
	only: z.enum(['all', 'good']).default('all')
});

/** What is wrong in one cell; row as the file counts it, the head being 1. */
export interface ImportFault {
	row: number;
	column: string;
	text: string;
}

/** One load as the preview shows it. */
export interface ImportLoad {
	name: string;
	firstRow: number;
	supplier: string;
	due: string;
	lines: number;
	cases: number;
	faults: ImportFault[];
	/** The docket these papers opened already. */
	knownAs: string | null;
}

export interface ImportPreview {
	/** What keeps the whole file from being read. */
	fault: string | null;
	loads: ImportLoad[];
	rows: number;
}
