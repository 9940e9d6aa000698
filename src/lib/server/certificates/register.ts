import { createHash, X509Certificate } from 'node:crypto';
import { v7 as uuid } from 'uuid';
import type { Context } from '../context';
import { Certificate } from '../db/models/certificate';
import { Organisation } from '../db/models/organisation';
import type { Writing } from '../db/transaction';

/** The certificate in use, if any was made yet. */
export function findCurrentCertificate(): Promise<Certificate | null> {
	return Certificate.findOne({ where: { retiredAt: null }, order: [['createdAt', 'desc']] });
}

/** Two that change the certificate at once wait for each other. */
export async function lockOrganisation(id: string, { transaction }: Writing): Promise<void> {
	await Organisation.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE, rejectOnEmpty: true });
}

/** Puts a certificate into use and retires the one before; the register forgets none. The organisation is locked. */
export async function makeCurrent(
	ctx: Context,
	organisationId: string,
	pem: string,
	how: 'certificate.made' | 'certificate.replaced',
	{ transaction, record }: Writing
): Promise<Certificate> {
	const x509 = new X509Certificate(pem);
	const sha256 = createHash('sha256').update(x509.raw).digest('hex');
	const known = await Certificate.findOne({ where: { sha256 }, transaction });
	if (known && !known.retiredAt) return known;
	await Certificate.update({ retiredAt: ctx.now }, { where: { retiredAt: null }, transaction });
	const row = known
		? await known.update({ retiredAt: null, warnedAt: null }, { transaction })
		: await Certificate.create(rowOf(x509, pem, sha256, organisationId, ctx.now), { transaction });
	record(how, { scope: 'organisation', id: organisationId }, { certificateId: row.id, sha256 });
	return row;
}

function rowOf(x509: X509Certificate, pem: string, sha256: string, organisationId: string, now: Date) {
	return {
		id: uuid(),
		organisationId,
		subject: x509.subject.replaceAll('\n', ', ').slice(0, 300),
		serial: x509.serialNumber.slice(0, 64),
		sha256,
		pem,
		validFrom: new Date(x509.validFrom),
		validUntil: new Date(x509.validTo),
		createdAt: now
	};
}
