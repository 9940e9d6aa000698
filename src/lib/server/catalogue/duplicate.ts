import { UniqueConstraintError } from 'sequelize';
import { Refusal } from '../refusals';

/** Translates the database's own refusal of a second record with one name. @throws Refusal `duplicate` */
export async function orDuplicate<Result>(work: Promise<Result>, sentence: string): Promise<Result> {
	try {
		return await work;
	} catch (error) {
		if (error instanceof UniqueConstraintError) throw new Refusal('duplicate', sentence);
		throw error;
	}
}
