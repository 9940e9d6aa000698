import { existsSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import type { Context } from '../context';
import type { Certificate } from '../db/models/certificate';
import { Organisation } from '../db/models/organisation';
import { inTransaction } from '../db/transaction';
import { env } from '../env';
import { createCertificate, loadCertificate } from '../reports/seal/certificate';
import type { SealKey } from '../reports/pdf/run-worker';
import { firstStorePath, keepFirstStore, storePathOf } from './key-folder';
import { findCurrentCertificate, lockOrganisation, makeCurrent } from './register';

/** The certificate reports are sealed with just now, and the key for it. */
export interface OrganisationCertificate {
	row: Certificate;
	key: SealKey;
}

async function makeP12(organisation: Organisation, now: Date): Promise<Uint8Array> {
	const { p12 } = await createCertificate({
		organisation: organisation.name,
		country: organisation.countryCode,
		now,
		passphrase: env().certificatePassphrase
	});
	return keepFirstStore(p12);
}

async function register(ctx: Context, organisation: Organisation, pem: string): Promise<Certificate> {
	return inTransaction(ctx, async (w) => {
		await lockOrganisation(organisation.id, w);
		return makeCurrent(ctx, organisation.id, pem, 'certificate.made', w);
	});
}

/**
 * The organisation's certificate: the one that was uploaded last, else the PKCS#12 file of the key folder, which is made
 * at first use. The public part of each stays on the register, so that old reports can still be checked.
 */
export async function organisationCertificate(ctx: Context): Promise<OrganisationCertificate> {
	const organisation = await Organisation.findOne();
	if (!organisation) throw new Error('There is no organisation yet, so nothing can be sealed.');
	const passphrase = env().certificatePassphrase;
	const current = await findCurrentCertificate();
	if (current && existsSync(storePathOf(current.sha256)))
		return { row: current, key: { p12: await readFile(storePathOf(current.sha256)), passphrase } };
	const p12 = existsSync(firstStorePath())
		? await readFile(firstStorePath())
		: await makeP12(organisation, ctx.now);
	const { certificatePem } = loadCertificate(p12, passphrase);
	return { row: await register(ctx, organisation, certificatePem), key: { p12, passphrase } };
}
