import { auditQuery } from '$lib/schemas/audit-list';
import { queryOf } from '$lib/schemas/list';
import { recordCsv } from '$lib/server/audit/export/record-csv';
import { recordPdf } from '$lib/server/audit/export/record-pdf';
import { contextOf, refusalAsJson } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import { csvResponse } from '$lib/server/traces/csv-response';
import type { RequestHandler } from './$types';

/** The audit trail as the filter leaves it: CSV, or with `as=pdf` a PDF. */
export const GET: RequestHandler = async ({ locals, url, cookies }) => {
	const ctx = contextOf(locals);

	const asked = queryOf(url.searchParams);
	const query = auditQuery.parse(asked);

	try {
		const { zone } = await getCurrentSite(ctx, cookies.get(siteCookie));
		if (asked.as !== 'pdf') return csvResponse(await recordCsv(ctx, query, zone));
		const { fileName, pdf } = await recordPdf(ctx, query, zone);
		return new Response(Uint8Array.from(pdf), {
			headers: {
				'content-type': 'application/pdf',
				'content-disposition': `attachment; filename="${fileName}"`,
				'content-security-policy': "sandbox; default-src 'none'"
			}
		});
	} catch (e) {
		return refusalAsJson(e);
	}
};
