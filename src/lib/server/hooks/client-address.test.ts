import { describe, expect, it } from 'vitest';
import { clientAddress } from './client-address';

const from = (address: string) => clientAddress({ getClientAddress: () => address });

describe('where a request came from', () => {
	it.each([
		['192.0.2.7', '192.0.2.7'],
		['::ffff:192.0.2.7', '192.0.2.7'],
		['192.0.2.7:51022', '192.0.2.7'],
		['[2001:DB8::7]:443', '2001:db8::7'],
		[' 2001:db8::7 ', '2001:db8::7']
	])('%s is %s', (given, kept) => expect(from(given)).toBe(kept));

	it.each([
		'',
		'unknown',
		'<script>',
		'192.0.2.7, 10.0.0.1',
		'192.0.2.7\nadmin',
		'999.1.1.1',
		'x'.repeat(500)
	])('%j is no address, so the trail says that it is unknown', (given) =>
		expect(from(given)).toBe('unknown')
	);

	it('is unknown where the server cannot tell', () => {
		expect(
			clientAddress({
				getClientAddress: () => {
					throw new Error('no header');
				}
			})
		).toBe('unknown');
	});
});
