import { completedKey } from '../../../domain/gs1/check-digit';
import type { Context } from '../../context';
import { addPartner } from '../../partners/save-partner';
import { saveContact } from '../../partners/save-contact';
import { carriers, suppliers, type DemoPartner } from './partners';

/** Company prefix of GS1's own examples: nobody's. */
export const samplePrefix = '0614141';

function mailOf(name: string, domain: string): string {
	const plain = name.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();
	return `${plain.replace(/[^a-z]+/g, '.')}@${domain}.example`;
}

async function enter(ctx: Context, firm: DemoPartner, nth: number): Promise<string> {
	const { name, address, countryCode, domain } = firm;
	const id = await addPartner(ctx, {
		...{ name, address, countryCode },
		isSupplier: firm.duty === 'supplier',
		isCarrier: firm.duty === 'carrier',
		isStore: firm.key === 'sarn',
		isCustomer: false,
		gln: completedKey('gln', `${samplePrefix}${String(210 + nth * 10).padStart(5, '0')}`),
		note: '',
		revision: ''
	});
	for (const contact of firm.contacts)
		await saveContact(ctx, id, {
			...contact,
			contactId: '',
			email: mailOf(contact.name, domain),
			phone: '',
			revision: ''
		});
	return id;
}

/** Enters the firms with their contacts. @returns their ids by key */
export async function enterPartners(ctx: Context): Promise<Map<string, string>> {
	const ids = new Map<string, string>();
	for (const [nth, firm] of [...suppliers, ...carriers].entries())
		ids.set(firm.key, await enter(ctx, firm, nth));
	return ids;
}
