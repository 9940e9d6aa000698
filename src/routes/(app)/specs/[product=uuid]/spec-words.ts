import { dayOfYear, shortDay, time, zoneName } from '$lib/format-time';
import type { MarkKind } from '$lib/components/ui/mark';
import type { PageData } from './$types';

type Version = PageData['versions'][number];

/** "since 4 Nov 2025", "1 Sep to 3 Nov 2025", "draft". */
export function whenInForce({ standing, inForceFrom, supersededAt }: Version, zone: string): string {
	if (standing === 'draft' || !inForceFrom) return 'draft';
	const from = dayWithoutName(inForceFrom, zone);
	if (standing === 'to-come') return `from ${from}`;
	if (standing === 'in-force' || !supersededAt) return `since ${from}`;
	return `${shortDay(inForceFrom, zone, 'en')} to ${dayWithoutName(supersededAt, zone)}`;
}

function dayWithoutName(at: string, zone: string): string {
	return dayOfYear(at, zone, 'en').replace(/^\S+ /, '');
}

/** A version's own address; the draft is what the page shows without one. */
export function versionHref({ standing, number }: Version, varietyId: string | null): string {
	const query = new URLSearchParams();
	if (varietyId) query.set('variety', varietyId);
	if (standing !== 'draft') query.set('version', String(number));
	return `?${query}`;
}

const verdicts: Record<Version['standing'], { mark: MarkKind | null; word: string }> = {
	draft: { mark: 'expected', word: 'Draft' },
	'in-force': { mark: 'accept', word: 'In force' },
	'to-come': { mark: 'conditions', word: 'To come' },
	superseded: { mark: null, word: 'Superseded' }
};

/** What the counterfoil says on top about the version in view. */
export function standingOf(
	shown: Version | null,
	inForce: Version | null,
	zone: string
): { mark: MarkKind | null; word: string; note: string } {
	if (!shown) return { mark: 'expected', word: 'No spec yet', note: 'Enter the figures and save a draft.' };
	const verdict = verdicts[shown.standing];
	if (shown.standing !== 'draft') {
		const by = shown.signedBy ? `, signed by ${shown.signedBy}` : '';
		return { ...verdict, note: `${whenInForce(shown, zone)}${by}. ${shown.reason}` };
	}
	const saved = `saved ${dayWithoutName(shown.savedAt, zone)} ${time(shown.savedAt, zone)} ${zoneName(shown.savedAt, zone)}`;
	const by = shown.savedBy ? `, ${shown.savedBy}` : '';
	return { ...verdict, note: `${saved}${by}.${inForce ? ` v${inForce.number} stays in force.` : ''}` };
}
