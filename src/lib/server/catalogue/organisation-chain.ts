import type { Transaction } from 'sequelize';
import type { ChainName } from '../audit/catalogue';
import { Organisation } from '../db/models/organisation';

/** The chain of what belongs to no site and no account: partners, loggers, products. */
export async function organisationChain(transaction: Transaction): Promise<ChainName> {
	const organisation = await Organisation.findOne({ attributes: ['id'], transaction });
	if (!organisation) throw new Error('This database has no organisation yet.');
	return { scope: 'organisation', id: organisation.id };
}
