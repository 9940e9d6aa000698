import type { LayoutView } from '../../schemas/layout';
import { LoggerRead } from '../db/models/logger-read';
import { Partner } from '../db/models/partner';
import type { RememberedLayout } from '../db/models/remembered-layout';
import { User } from '../db/models/user';
import { parseAnswers } from './answers';

interface Use {
	times: number;
	lastAt: Date | null;
}

/** How often files were read by each since; the file it was confirmed on is none of them. */
async function usesOf(layouts: readonly RememberedLayout[]): Promise<Map<string, Use>> {
	const reads = await LoggerRead.findAll({
		where: { layoutId: layouts.map(({ id }) => id) },
		attributes: ['id', 'layoutId', 'uploadedAt'],
		order: [['uploadedAt', 'DESC']]
	});
	return new Map(
		layouts.map(({ id, sourceReadId }) => {
			const used = reads.filter((read) => read.layoutId === id && read.id !== sourceReadId);
			return [id, { times: used.length, lastAt: used[0]?.uploadedAt ?? null }];
		})
	);
}

/** Remembered layouts as pages show them. */
export async function layoutViews(layouts: readonly RememberedLayout[]): Promise<LayoutView[]> {
	const people = layouts.flatMap(({ confirmedBy, withdrawnBy }) => [confirmedBy, withdrawnBy ?? []].flat());
	const users = await User.findAll({ where: { id: people }, attributes: ['id', 'name'] });
	const partners = await Partner.findAll({
		where: { id: layouts.flatMap(({ partnerId }) => partnerId ?? []) },
		attributes: ['id', 'name']
	});
	const nameOf = new Map([...users, ...partners].map(({ id, name }) => [id, name]));
	const uses = await usesOf(layouts);
	return layouts.map((layout) => ({
		id: layout.id,
		version: layout.version,
		answers: parseAnswers(layout.answers),
		fingerprint: layout.fingerprint,
		partnerName: layout.partnerId === null ? null : (nameOf.get(layout.partnerId) ?? ''),
		sourceName: layout.sourceName,
		confirmedBy: nameOf.get(layout.confirmedBy) ?? '',
		confirmedAt: layout.confirmedAt.toISOString(),
		timesUsed: uses.get(layout.id)?.times ?? 0,
		lastUsedAt: uses.get(layout.id)?.lastAt?.toISOString() ?? null,
		forgotten: forgottenOf(layout, nameOf)
	}));
}

function forgottenOf(
	{ withdrawnAt, withdrawnBy, withdrawnReason }: RememberedLayout,
	nameOf: ReadonlyMap<string, string>
): LayoutView['forgotten'] {
	if (withdrawnAt === null) return null;
	const by = withdrawnBy === null ? '' : (nameOf.get(withdrawnBy) ?? '');
	return { at: withdrawnAt.toISOString(), by, reason: withdrawnReason ?? '' };
}
