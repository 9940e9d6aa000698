import type { DocketView } from '$lib/schemas/docket';

export type Permissions = Record<
	'sign' | 'log' | 'hold' | 'lift' | 'upload' | 'trim' | 'claim' | 'accept',
	boolean
>;

/** The one next act of a docket for whoever looks at it; null where somebody else is due. */
export function primaryAct(
	docket: DocketView,
	may: Permissions
): { href: string; word: string; isDownload?: boolean } | null {
	const base = `/shipments/${docket.number}`;
	if (docket.stage === 'expected')
		return may.log ? { href: `${base}/arrival`, word: 'Log the arrival' } : null;
	if (docket.stage === 'done') {
		if (docket.hold && may.sign) return { href: `${base}/sign?amend`, word: 'Decide what is held' };
		const report = docket.signatures.at(-1)?.report;
		return report
			? { href: `/api/v1/reports/${report.id}`, word: 'Open the report', isDownload: true }
			: null;
	}
	if (may.sign) return { href: `${base}/sign`, word: 'Sign disposition' };
	if (may.accept) return { href: `${base}/sign`, word: 'Accept at the dock' };
	const hasRead = docket.loggers.some((logger) => logger.traceId !== null);
	return may.upload
		? { href: `${base}/reads`, word: hasRead ? 'Upload another read' : 'Upload a read' }
		: null;
}
