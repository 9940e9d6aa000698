import { v7 as uuid } from 'uuid';
import type { PartnerForm } from '../../schemas/partner';
import { orDuplicate } from '../catalogue/duplicate';
import { organisationChain } from '../catalogue/organisation-chain';
import { assertUnchanged } from '../catalogue/revision';
import type { Context } from '../context';
import { Partner } from '../db/models/partner';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { partnerFields } from './views';

const taken = 'There is a firm of that name already. Open that one, or write the name in full.';

/** Puts a firm on the register. @returns its id. @throws Refusal `not-allowed`, `duplicate` */
export async function addPartner(ctx: Context, form: PartnerForm): Promise<string> {
	authorize(ctx, 'catalogue.change');
	const { revision: _, ...fields } = form;
	const id = uuid();
	const writing = inTransaction(ctx, async ({ transaction, record }) => {
		const partner = await Partner.create({ id, ...fields, createdAt: ctx.now }, { transaction });
		const after = partnerFields(partner);
		record('partner.saved', await organisationChain(transaction), { partnerId: id, before: null, after });
	});
	await orDuplicate(writing, taken);
	return id;
}

/** Changes a firm's record. @throws Refusal `not-found`, `not-allowed`, `duplicate`, `changed-meanwhile` */
export async function changePartner(ctx: Context, partnerId: string, form: PartnerForm): Promise<void> {
	authorize(ctx, 'catalogue.change');
	const { revision, ...fields } = form;
	const writing = inTransaction(ctx, async ({ transaction, record }) => {
		const partner = await Partner.findByPk(partnerId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!partner) throw new Refusal('not-found');
		const before = partnerFields(partner);
		assertUnchanged(revision, before);
		await partner.update(fields, { transaction });
		const after = partnerFields(partner);
		record('partner.saved', await organisationChain(transaction), { partnerId, before, after });
	});
	await orDuplicate(writing, taken);
}

/** Takes a firm out of the choices, or back in; its dockets stay. @throws Refusal `not-found`, `not-allowed` */
export async function switchPartner(ctx: Context, partnerId: string, isOn: boolean): Promise<void> {
	authorize(ctx, 'catalogue.change');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const partner = await Partner.findByPk(partnerId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!partner) throw new Refusal('not-found');
		if ((partner.switchedOffAt === null) === isOn) return;
		await partner.update({ switchedOffAt: isOn ? null : ctx.now }, { transaction });
		record('partner.saved', await organisationChain(transaction), {
			partnerId,
			before: { isInUse: !isOn },
			after: { isInUse: isOn }
		});
	});
}
