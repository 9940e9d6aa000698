import { v7 as uuid } from 'uuid';
import type { LoggerForm } from '../../schemas/logger';
import { orDuplicate } from '../catalogue/duplicate';
import { organisationChain } from '../catalogue/organisation-chain';
import { assertUnchanged } from '../catalogue/revision';
import type { Context } from '../context';
import { Logger } from '../db/models/logger';
import { Partner } from '../db/models/partner';
import { inTransaction, type Writing } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { loggerFields } from './views';

const taken = 'A logger with that serial is on the register already.';

async function assertOwner({ transaction }: Writing, ownerId: string | null): Promise<void> {
	if (ownerId && !(await Partner.findByPk(ownerId, { transaction })))
		throw new Refusal('not-found', 'The owner is not among the partners any more. Choose another.');
}

/** Puts an instrument on the register. @returns its id. @throws Refusal `not-allowed`, `duplicate`, `not-found` */
export async function addLogger(ctx: Context, form: LoggerForm): Promise<string> {
	authorize(ctx, 'catalogue.change');
	const { revision: _, ...fields } = form;
	const id = uuid();
	const writing = inTransaction(ctx, async (w) => {
		await assertOwner(w, fields.ownerId);
		const logger = await Logger.create({ id, ...fields, createdAt: ctx.now }, { transaction: w.transaction });
		const chain = await organisationChain(w.transaction);
		w.record('logger.saved', chain, { loggerId: id, before: null, after: loggerFields(logger) });
	});
	await orDuplicate(writing, taken);
	return id;
}

/** Changes an instrument's record. @throws Refusal `not-found`, `not-allowed`, `duplicate`, `changed-meanwhile` */
export async function changeLogger(ctx: Context, loggerId: string, form: LoggerForm): Promise<void> {
	authorize(ctx, 'catalogue.change');
	const { revision, ...fields } = form;
	const writing = inTransaction(ctx, async (w) => {
		const { transaction } = w;
		const logger = await Logger.findByPk(loggerId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!logger) throw new Refusal('not-found');
		const before = loggerFields(logger);
		assertUnchanged(revision, before);
		await assertOwner(w, fields.ownerId);
		await logger.update(fields, { transaction });
		const chain = await organisationChain(transaction);
		w.record('logger.saved', chain, { loggerId, before, after: loggerFields(logger) });
	});
	await orDuplicate(writing, taken);
}

/** Takes an instrument out of use, or back in; its trips stay. @throws Refusal `not-found`, `not-allowed` */
export async function switchLogger(ctx: Context, loggerId: string, isOn: boolean): Promise<void> {
	authorize(ctx, 'catalogue.change');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const logger = await Logger.findByPk(loggerId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!logger) throw new Refusal('not-found');
		if ((logger.switchedOffAt === null) === isOn) return;
		await logger.update({ switchedOffAt: isOn ? null : ctx.now }, { transaction });
		record('logger.saved', await organisationChain(transaction), {
			loggerId,
			before: { isInUse: !isOn },
			after: { isInUse: isOn }
		});
	});
}
