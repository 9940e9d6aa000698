import type { Context } from '../context';
import { RecommendationMove } from '../db/models/recommendation-move';
import type { Writing } from '../db/transaction';
import { movedText, standingOf, type Standing } from './moved-recommendation';

/** Only of lines that something was recommended for already: what is assessed for the first time was not corrected. */
function knownLines(standing: Standing, other: Standing): Standing {
	return Object.fromEntries(Object.entries(standing).filter(([id]) => id in other));
}

interface Correcting {
	/** Made before the transaction, which may have to run twice. */
	id: string;
	shipmentId: string;
	/** What sort of correction it turned out to be; null where it was none. */
	kind: () => RecommendationMove['kind'] | null;
}

/** Makes a correction, which assesses again, and keeps beside the docket that it moved what is recommended. */
export async function keepMove(
	ctx: Context,
	{ transaction }: Writing,
	{ id, shipmentId, kind }: Correcting,
	correct: () => Promise<void>
): Promise<void> {
	const before = await standingOf(shipmentId, transaction);
	await correct();
	const after = await standingOf(shipmentId, transaction);
	const moved = movedText(knownLines(before, after), knownLines(after, before));
	const sort = moved === null ? null : kind();
	if (moved === null || sort === null) return;
	await RecommendationMove.create(
		{ id, shipmentId, kind: sort, madeBy: ctx.actor.id, madeAt: ctx.now, moved },
		{ transaction }
	);
}
