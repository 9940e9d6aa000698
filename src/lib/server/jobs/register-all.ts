import { mailCertificateEnd } from '../certificates/mail-end';
import { mailLink } from '../accounts/mail-link';
import { mailLock } from '../accounts/tell-admins-of-lock';
import { makeCheckpoint } from '../audit/checkpoint';
import { sendNotice } from '../notices/send-notice';
import { ensureReport } from '../reports/make-report';
import { runRetention } from '../retention/run-retention';
import { registerJobKind } from './job-kinds';

/** Every kind of job and who does it. */
export function registerAllJobs(): void {
	registerJobKind(
		'report',
		async (ctx, { dispositionId }) => void (await ensureReport(ctx, dispositionId ?? ''))
	);
	registerJobKind('audit-checkpoint', async ({ now }) => void (await makeCheckpoint(now)));
	registerJobKind('retention', async (ctx) => void (await runRetention(ctx)));
	registerJobKind('mail-link', mailLink);
	registerJobKind('lock-mail', mailLock);
	registerJobKind('certificate-ending', mailCertificateEnd);
	registerJobKind('notice', (ctx, { noticeId }) => sendNotice(ctx, noticeId ?? ''));
}
