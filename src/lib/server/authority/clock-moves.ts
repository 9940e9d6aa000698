import type { Transaction } from 'sequelize';
import type { CorrectionView } from '../../schemas/signing';
import { ClockCorrection } from '../db/models/clock-correction';
import { LoggerRead } from '../db/models/logger-read';
import { User } from '../db/models/user';
import { parseMoved } from './moved-recommendation';

/** The standing corrections of clocks on a docket that moved what is recommended. */
export async function clockMovesOf(shipmentId: string, transaction?: Transaction): Promise<CorrectionView[]> {
	const reads = await LoggerRead.findAll({ where: { shipmentId }, attributes: ['id'], transaction });
	const rows = await ClockCorrection.findAll({
		where: { readId: reads.map(({ id }) => id), undoneAt: null },
		order: ['madeAt'],
		transaction
	});
	const moving = rows.flatMap(({ madeBy, movedRecommendation }) =>
		movedRecommendation === null ? [] : [{ madeBy, text: movedRecommendation }]
	);
	const users = await User.findAll({ where: { id: moving.map(({ madeBy }) => madeBy) }, transaction });
	return moving.map(({ madeBy, text }) => ({
		kind: 'clock',
		madeById: madeBy,
		madeBy: users.find(({ id }) => id === madeBy)?.name ?? '',
		...parseMoved(text)
	}));
}
