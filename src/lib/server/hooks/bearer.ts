const apiPath = '/api/v1/';

/** The token a program shows; null for a browser, and outside the API, where only sessions count. */
export function bearerOf(event: { request: Request; url: URL }): string | null {
	if (!event.url.pathname.startsWith(apiPath)) return null;
	const header = event.request.headers.get('authorization');
	const match = header === null ? null : /^bearer\s+(\S{1,200})\s*$/i.exec(header);
	return match?.[1] ?? null;
}
