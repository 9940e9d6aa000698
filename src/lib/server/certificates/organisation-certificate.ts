import { createHash, X509Certificate } from 'node:crypto';
import { existsSync } from 'node:fs';
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { v7 as uuid } from 'uuid';
import type { Context } from '../context';
import { Certificate } from '../db/models/certificate';
import { Organisation } from '../db/models/organisation';
import { inTransaction } from '../db/transaction';
import { env } from '../env';
import { createCertificate, loadCertificate } from '../reports/seal/certificate';
import type { SealKey } from '../reports/pdf/run-worker';

const fileName = 'organisation.p12';

/** The certificate reports are sealed with just now, and the key for it. */
export interface OrganisationCertificate {
	row: Certificate;
	key: SealKey;
}

async function makeP12(organisation: Organisation, now: Date): Promise<Uint8Array> {
	const { keysFolder, certificatePassphrase } = env();
	const { p12 } = await createCertificate({
		organisation: organisation.name,
		country: organisation.countryCode,
		now,
		passphrase: certificatePassphrase
	});
	await mkdir(keysFolder, { recursive: true, mode: 0o700 });
	// Of two processes that start at once the first one's key stays.
	await writeFile(join(keysFolder, fileName), p12, { mode: 0o600, flag: 'wx' }).catch(
		(error: NodeJS.ErrnoException) => {
			if (error.code !== 'EEXIST') throw error;
		}
	);
	return readFile(join(keysFolder, fileName));
}

async function register(ctx: Context, organisation: Organisation, pem: string): Promise<Certificate> {
	const x509 = new X509Certificate(pem);
	const sha256 = createHash('sha256').update(x509.raw).digest('hex');
	const known = await Certificate.findOne({ where: { sha256 } });
	if (known) return known;
	const id = uuid();
	return inTransaction(ctx, async ({ transaction, record }) => {
		await Certificate.update({ retiredAt: ctx.now }, { where: { retiredAt: null }, transaction });
		const row = await Certificate.create(
			{
				id,
				organisationId: organisation.id,
				subject: x509.subject.replaceAll('\n', ', ').slice(0, 300),
				serial: x509.serialNumber.slice(0, 64),
				sha256,
				pem,
				validFrom: new Date(x509.validFrom),
				validUntil: new Date(x509.validTo),
				createdAt: ctx.now
			},
			{ transaction }
		);
		record('certificate.made', { scope: 'organisation', id: organisation.id }, { certificateId: id, sha256 });
		return row;
	});
}

/**
 * The organisation's certificate: the PKCS#12 file in the key folder, made at first use. Replacing the file replaces
 * the certificate; the public part of each stays on the register, so that old reports can still be checked.
 */
export async function organisationCertificate(ctx: Context): Promise<OrganisationCertificate> {
	const organisation = await Organisation.findOne();
	if (!organisation) throw new Error('There is no organisation yet, so nothing can be sealed.');
	const { keysFolder, certificatePassphrase } = env();
	const path = join(keysFolder, fileName);
	const p12 = existsSync(path) ? await readFile(path) : await makeP12(organisation, ctx.now);
	const { certificatePem } = loadCertificate(p12, certificatePassphrase);
	return {
		row: await register(ctx, organisation, certificatePem),
		key: { p12, passphrase: certificatePassphrase }
	};
}
