import forge from 'node-forge';
import { X509Certificate } from 'node:crypto';
import { certificateFaultText } from '../../messages/en/certificate-faults';
import type { Context } from '../context';
import { Organisation } from '../db/models/organisation';
import { inTransaction } from '../db/transaction';
import { env } from '../env';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { storeBytes } from '../reports/seal/certificate';
import { keepStore } from './key-folder';
import { readUploadedStore } from './read-uploaded';
import { findCurrentCertificate, lockOrganisation, makeCurrent } from './register';

/**
 * Puts an uploaded certificate with its key into use. The password opens the file once and is kept nowhere: the key is
 * locked again under this installation's own passphrase. Earlier certificates stay on the register.
 * @throws Refusal `not-allowed`, `invalid` in words, `duplicate`
 */
export async function replaceCertificate(
	ctx: Context,
	{ p12, password }: { p12: Uint8Array; password: string }
): Promise<void> {
	authorize(ctx, 'certificate.manage');
	const store = readUploadedStore(p12, password, ctx.now);
	if (typeof store === 'string') throw new Refusal('invalid', certificateFaultText[store]);
	const pem = forge.pki.certificateToPem(store.own);
	const sha256 = new X509Certificate(pem).fingerprint256.replaceAll(':', '').toLowerCase();
	if ((await findCurrentCertificate())?.sha256 === sha256)
		throw new Refusal('duplicate', 'This certificate is in use already.');
	const organisation = await Organisation.findOne({ rejectOnEmpty: true });
	await keepStore(sha256, storeBytes(store.key, [store.own, ...store.chain], env().certificatePassphrase));
	await inTransaction(ctx, async (w) => {
		await lockOrganisation(organisation.id, w);
		await makeCurrent(ctx, organisation.id, pem, 'certificate.replaced', w);
	});
}
