import { isIP } from 'node:net';

/**
 * Where a request came from, as the trail keeps it: an IP address, or "unknown". What X-Forwarded-For says counts only
 * behind a trusted proxy, and of it only what that proxy added; the server's adapter sees to both.
 */
export function clientAddress(event: { getClientAddress: () => string }): string {
	let given: string;
	try {
		given = event.getClientAddress();
	} catch {
		// No socket behind the request, or a trusted proxy that did not say.
		return 'unknown';
	}
	const bare = given
		.trim()
		.replace(/^\[(.*)\](:\d+)?$/, '$1')
		.replace(/^(\d+\.\d+\.\d+\.\d+):\d+$/, '$1')
		.replace(/^::ffff:(?=\d+\.)/i, '');
	return isIP(bare) ? bare.toLowerCase() : 'unknown';
}
