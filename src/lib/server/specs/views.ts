import type { Spec } from '../../domain/shelf-life/spec';
import type { SpecVersion } from '../db/models/spec-version';
import { figuresFrom } from './figures';

/** Where a version stands at the moment it is looked at. */
export type SpecStanding = 'draft' | 'in-force' | 'to-come' | 'superseded';

/** A numbered version as the editor shows it. */
export interface SpecVersionView {
	id: string;
	number: number;
	standing: SpecStanding;
	figures: Spec;
	figuresSha256: string;
	reason: string;
	savedBy: string | null;
	savedAt: string;
	signedBy: string | null;
	signedAt: string | null;
	inForceFrom: string | null;
	supersededAt: string | null;
	/** Dockets assessed with it as they stand now. */
	dockets: number;
}

export function specVersionView(
	version: SpecVersion,
	now: Date,
	nameOf: (userId: string | null) => string | null,
	dockets: number
): SpecVersionView {
	return {
		id: version.id,
		number: version.number,
		standing: standingOf(version, now),
		figures: figuresFrom(version.figures),
		figuresSha256: version.figuresSha256,
		reason: version.reason,
		savedBy: nameOf(version.createdBy),
		savedAt: version.createdAt.toISOString(),
		signedBy: nameOf(version.signedBy),
		signedAt: version.signedAt?.toISOString() ?? null,
		inForceFrom: version.inForceFrom?.toISOString() ?? null,
		supersededAt: version.supersededAt?.toISOString() ?? null,
		dockets
	};
}

function standingOf({ state, inForceFrom, supersededAt }: SpecVersion, now: Date): SpecStanding {
	if (state === 'draft') return 'draft';
	if (supersededAt && supersededAt <= now) return 'superseded';
	return inForceFrom && inForceFrom <= now ? 'in-force' : 'to-come';
}
