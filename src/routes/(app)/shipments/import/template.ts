import { importColumns } from '$lib/schemas/import';

/** The template as a link holds it: the head row and one row of samples. */
export const templateHref = `data:text/csv;charset=utf-8,${encodeURIComponent(
	[importColumns.map(({ name }) => name), importColumns.map(({ sample }) => sample)]
		.map((cells) => cells.join(','))
		.join('\r\n') + '\r\n'
)}`;
