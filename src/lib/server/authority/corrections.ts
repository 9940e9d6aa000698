import type { Transaction } from 'sequelize';
import type { CorrectionView } from '../../schemas/signing';
import { RecommendationMove } from '../db/models/recommendation-move';
import { TraceRow } from '../db/models/trace-row';
import { TrimRow } from '../db/models/trim-row';
import { User } from '../db/models/user';
import { clockMovesOf } from './clock-moves';
import { parseMoved } from './moved-recommendation';

interface Moving {
	kind: CorrectionView['kind'];
	madeBy: string;
	text: string;
}

type Move = Omit<CorrectionView, 'madeBy'>;

async function trimMovesOf(shipmentId: string, transaction?: Transaction): Promise<Moving[]> {
	const traces = await TraceRow.findAll({ where: { shipmentId }, attributes: ['id'], transaction });
	const trims = await TrimRow.findAll({
		where: { traceId: traces.map(({ id }) => id), undoneAt: null },
		order: ['madeAt'],
		transaction
	});
	return trims.flatMap(({ madeBy, movedRecommendation }) =>
		movedRecommendation === null ? [] : [{ kind: 'trim' as const, madeBy, text: movedRecommendation }]
	);
}

/**
 * What one person moved by one sort of correction, from the first state to the last: a time entered wrongly and put
 * right again moved nothing. Null where nothing is left of it.
 */
function netMove(moves: readonly Move[]): Move | null {
	const [first] = moves;
	const last = moves.at(-1);
	if (!first || !last) return null;
	const before = Object.assign({}, ...moves.map((move) => move.before).reverse());
	const after = Object.assign({}, ...moves.map((move) => move.after));
	const isMoved = Object.keys(after).some((id) => before[id]?.recommended !== after[id]?.recommended);
	return isMoved ? { ...first, before, after } : null;
}

async function keptMovesOf(shipmentId: string, transaction?: Transaction): Promise<Move[]> {
	const rows = await RecommendationMove.findAll({
		where: { shipmentId },
		order: ['madeAt', 'id'],
		transaction
	});
	const groups = new Map<string, Move[]>();
	for (const { kind, madeBy, moved } of rows) {
		const key = `${kind} ${madeBy}`;
		groups.set(key, [...(groups.get(key) ?? []), { kind, madeById: madeBy, ...parseMoved(moved) }]);
	}
	return [...groups.values()].map(netMove).filter((move) => move !== null);
}

/** Every correction standing on a docket that moved what is recommended, whoever made it and of whatever sort. */
export async function correctionsOf(
	shipmentId: string,
	transaction?: Transaction
): Promise<CorrectionView[]> {
	const [trims, kept, clocks] = await Promise.all([
		trimMovesOf(shipmentId, transaction),
		keptMovesOf(shipmentId, transaction),
		clockMovesOf(shipmentId, transaction)
	]);
	const moves = [
		...trims.map(({ kind, madeBy, text }) => ({ kind, madeById: madeBy, ...parseMoved(text) })),
		...kept
	];
	const users = await User.findAll({ where: { id: moves.map(({ madeById }) => madeById) }, transaction });
	const named = moves.map((move) => ({
		...move,
		madeBy: users.find(({ id }) => id === move.madeById)?.name ?? ''
	}));
	return [...named, ...clocks];
}
