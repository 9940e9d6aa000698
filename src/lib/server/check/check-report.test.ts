import { describe, expect, it } from 'vitest';
import { v7 as uuid } from 'uuid';
import { arrivedDocket, sealedFor, signed } from '../../../../tests/helpers/sealed-docket';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { testNow } from '../../../../tests/helpers/factories';
import type { RequestScope } from '../request-scope';
import { checkReport } from './check-report';

useTestDatabase();

const visitor = (address = uuid()): RequestScope => ({ requestId: 'r', address, now: testNow });

describe('asking whether a report is genuine', () => {
	it('finds it by the code on its foot, by the whole digest of its record and by its file', async () => {
		const docket = await arrivedDocket();
		const disposition = await signed(docket);
		const code = disposition.frozenSha256.slice(0, 16);
		const unsealed = { standing: 'current', version: 1, signedAt: testNow.toISOString(), pdfSha256: null };
		expect(await checkReport(code, visitor())).toEqual(unsealed);
		const { sha256 } = await sealedFor(docket.ctx, docket.shipment.number, disposition);
		const answer = { ...unsealed, pdfSha256: sha256 };
		for (const asked of [
			code,
			code.toUpperCase(),
			code.replace(/.{4}/gu, '$& '),
			disposition.frozenSha256,
			sha256
		])
			expect(await checkReport(asked, visitor())).toEqual(answer);
	});

	it('says that it was superseded once a newer version is signed, of code and file alike', async () => {
		const docket = await arrivedDocket();
		const first = await signed(docket);
		const sealed = await sealedFor(docket.ctx, docket.shipment.number, first);
		const second = await signed(docket);
		for (const asked of [first.frozenSha256.slice(0, 16), sealed.sha256])
			expect(await checkReport(asked, visitor())).toMatchObject({ standing: 'superseded', version: 1 });
		expect(await checkReport(second.frozenSha256.slice(0, 16), visitor())).toMatchObject({
			standing: 'current',
			version: 2
		});
	});

	it('knows no other file, no export, no shorter code and no pattern', async () => {
		const docket = await arrivedDocket();
		const { frozenSha256 } = await signed(docket);
		for (const asked of [
			'0'.repeat(16),
			'f'.repeat(64),
			frozenSha256.slice(0, 15),
			`${frozenSha256.slice(0, 15)}%`,
			'%'.repeat(16),
			docket.shipment.number,
			''
		])
			expect(await checkReport(asked, visitor())).toEqual({ standing: 'unknown' });
	});

	it('answers sixty times in a quarter of an hour to one address, and others all the while', async () => {
		const asking = visitor('203.0.113.7');
		for (let i = 0; i < 60; i++) await checkReport('0'.repeat(16), asking);
		await expect(checkReport('0'.repeat(16), asking)).rejects.toMatchObject({ code: 'too-many-attempts' });
		expect(await checkReport('0'.repeat(16), visitor('203.0.113.8'))).toEqual({ standing: 'unknown' });
		const later = { ...asking, now: new Date(testNow.getTime() + 16 * 60_000) };
		expect(await checkReport('0'.repeat(16), later)).toEqual({ standing: 'unknown' });
	});
});
