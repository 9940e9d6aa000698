import { X509Certificate } from 'node:crypto';
import { Certificate } from '../db/models/certificate';
import { Report } from '../db/models/report';
import type { Context } from '../context';
import { env } from '../env';
import { authorize } from '../policies';
import { warnDaysAhead } from './warn-of-end';

/** A certificate as the settings show it; nothing of its key. */
export interface CertificateView {
	id: string;
	subject: string;
	issuer: string;
	isSelfSigned: boolean;
	serial: string;
	sha256: string;
	keyBits: number | null;
	validFromAt: string;
	validUntilAt: string;
	retiredAt: string | null;
	reports: number;
	/** Whole days until it ends; negative once it has. */
	daysLeft: number;
	isEnding: boolean;
}

const dayMs = 86_400_000;

function viewOf(row: Certificate, reports: number, now: Date): CertificateView {
	const x509 = new X509Certificate(row.pem);
	const daysLeft = Math.floor((row.validUntil.getTime() - now.getTime()) / dayMs);
	return {
		id: row.id,
		subject: row.subject,
		issuer: x509.issuer.replaceAll('\n', ', '),
		isSelfSigned: x509.issuer === x509.subject,
		serial: row.serial,
		sha256: row.sha256,
		keyBits: x509.publicKey.asymmetricKeyDetails?.modulusLength ?? null,
		validFromAt: row.validFrom.toISOString(),
		validUntilAt: row.validUntil.toISOString(),
		retiredAt: row.retiredAt?.toISOString() ?? null,
		reports,
		daysLeft,
		isEnding: daysLeft < warnDaysAhead
	};
}

/** Every certificate there was, the one in use first. @throws Refusal `not-allowed` */
export async function listCertificates(
	ctx: Context
): Promise<{ items: CertificateView[]; total: number; timestampAuthority: string | null }> {
	authorize(ctx, 'certificate.manage');
	const rows = await Certificate.findAll({ order: [['createdAt', 'desc']] });
	const inUseFirst = rows.toSorted((a, b) => Number(b.retiredAt === null) - Number(a.retiredAt === null));
	const items = await Promise.all(
		inUseFirst.map(async (row) =>
			viewOf(row, await Report.count({ where: { certificateId: row.id } }), ctx.now)
		)
	);
	const { timestampUrl } = env();
	return {
		items,
		total: items.length,
		timestampAuthority: timestampUrl === null ? null : new URL(timestampUrl).host
	};
}
