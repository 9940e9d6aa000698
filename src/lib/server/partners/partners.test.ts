import { describe, expect, it } from 'vitest';
import {
	buildContact,
	buildPartner,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { contactForm, partnerForm, partnerQuery } from '../../schemas/partner';
import { verifyAllChains } from '../audit/verify';
import type { Context, Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { LinkSession } from '../db/models/link-session';
import { findToken, saveToken, useToken } from '../accounts/tokens';
import { getPartner } from './get-partner';
import { listPartnerChoices, listPartners } from './list-partners';
import { saveContact, switchContact } from './save-contact';
import { addPartner, changePartner, switchPartner } from './save-partner';

useTestDatabase();

async function as(role: Role): Promise<Context> {
	if (role === 'supplier')
		return contextFor(await buildUser(['supplier'], { partner: await buildPartner() }));
	return contextFor(await buildUser([role], { sites: [await buildSite()] }));
}

const filled = { name: 'Tessil Hill Fruit', isSupplier: 'on', address: 'Tessil', countryCode: 'es' };
const form = (more: Record<string, unknown> = {}) => partnerForm.parse({ ...filled, ...more });
const contact = (more: Record<string, unknown> = {}) =>
	contactForm.parse({ name: 'Ana', email: 'Ana@Tessil.example', duty: 'quality', isNotified: 'on', ...more });

async function lastEntry(type: string) {
	const entry = await AuditEntry.findOne({ where: { type }, order: [['seq', 'DESC']] });
	const payload = await AuditPayload.findByPk(entry?.id ?? '');
	return { entry, data: JSON.parse(payload?.text ?? 'null') };
}

describe('the register of partners', () => {
	it('is read by all staff, changed by admins only, and closed to suppliers', async () => {
		const partner = await buildPartner();
		const person = await buildContact(partner);
		for (const role of ['dock', 'qa', 'claims', 'supplier'] as const) {
			const ctx = await as(role);
			const refused = expect.objectContaining({ code: 'not-allowed' });
			await expect(addPartner(ctx, form())).rejects.toEqual(refused);
			await expect(changePartner(ctx, partner.id, form())).rejects.toEqual(refused);
			await expect(switchPartner(ctx, partner.id, false)).rejects.toEqual(refused);
			await expect(saveContact(ctx, partner.id, contact())).rejects.toEqual(refused);
			await expect(switchContact(ctx, partner.id, person.id, false)).rejects.toEqual(refused);
			const reading = [
				() => listPartners(ctx, partnerQuery.parse({})),
				() => getPartner(ctx, partner.id),
				() => listPartnerChoices(ctx, 'supplier')
			];
			for (const read of reading) {
				if (role === 'supplier') await expect(read()).rejects.toEqual(refused);
				else await expect(read()).resolves.toBeTruthy();
			}
		}
	});

	it('keeps a new firm with an audit entry that holds all of it', async () => {
		const ctx = await as('admin');
		const id = await addPartner(ctx, form({ gln: '950 600005 001 0', name: 'Skerrin Shellfish' }));
		expect(await getPartner(ctx, id)).toMatchObject({
			name: 'Skerrin Shellfish',
			gln: '9506000050010',
			duties: ['supplier'],
			countryCode: 'ES'
		});
		const { entry, data } = await lastEntry('partner.saved');
		expect(entry?.actorId).toBe(ctx.actor.id);
		expect(data).toMatchObject({ partnerId: id, before: null, after: { name: 'Skerrin Shellfish' } });
		expect((await verifyAllChains()).faults).toEqual([]);
	});

	it('writes both states of a change, and refuses a form drawn before another was saved', async () => {
		const ctx = await as('admin');
		const id = await addPartner(ctx, form({ name: 'Rocanegra Vines' }));
		const { revision } = await getPartner(ctx, id);
		await changePartner(ctx, id, form({ name: 'Rocanegra Vines', address: 'Dock road 4', revision }));
		expect((await lastEntry('partner.saved')).data).toMatchObject({
			before: { address: 'Tessil' },
			after: { address: 'Dock road 4' }
		});
		const late = changePartner(ctx, id, form({ name: 'Rocanegra Vines', address: 'Elsewhere', revision }));
		await expect(late).rejects.toMatchObject({ code: 'changed-meanwhile' });
		expect((await getPartner(ctx, id)).address).toBe('Dock road 4');
	});

	it('has a name once', async () => {
		const ctx = await as('admin');
		await addPartner(ctx, form({ name: 'Lanyard Freight', isCarrier: 'on' }));
		await expect(addPartner(ctx, form({ name: 'Lanyard Freight' }))).rejects.toMatchObject({
			code: 'duplicate'
		});
	});

	it('leaves a firm that is switched off out of choices and the usual list, not out of its dockets', async () => {
		const ctx = await as('admin');
		const site = await buildSite();
		const partner = await buildPartner({ name: 'Vesterglas Growers' });
		await buildShipment({ site, supplier: partner });
		await switchPartner(ctx, partner.id, false);
		expect((await listPartnerChoices(ctx, 'supplier')).map(({ id }) => id)).not.toContain(partner.id);
		const query = (state: string) => partnerQuery.parse({ q: 'Vesterglas', state });
		expect((await listPartners(ctx, query('in-use'))).total).toBe(0);
		expect((await listPartners(ctx, query('off'))).total).toBe(1);
		const qa = await contextFor(await buildUser(['qa'], { sites: [site] }));
		expect((await getPartner(qa, partner.id)).dockets).toBe(1);
		await switchPartner(ctx, partner.id, true);
		expect((await getPartner(ctx, partner.id)).switchedOffAt).toBeNull();
	});

	it('is searched by name, address and GLN, filtered, sorted and cut into pages', async () => {
		const ctx = await as('admin');
		for (let i = 0; i < 42; i++)
			await buildPartner({
				name: `Quayside ${String(i).padStart(2, '0')}`,
				isSupplier: false,
				isCarrier: true
			});
		await buildPartner({ name: 'Hundred% Fresh', gln: '9506000050027', countryCode: 'NL' });
		const list = (query: Record<string, string>) => listPartners(ctx, partnerQuery.parse(query));
		const first = await list({ q: 'Quayside', dir: 'desc' });
		expect(first.total).toBe(42);
		expect(first.items).toHaveLength(40);
		expect(first.items[0]?.name).toBe('Quayside 41');
		expect((await list({ q: 'Quayside', page: '2' })).items.map(({ name }) => name)).toEqual([
			'Quayside 40',
			'Quayside 41'
		]);
		expect((await list({ q: '9506000050027' })).items[0]?.name).toBe('Hundred% Fresh');
		expect((await list({ q: '%' })).items.map(({ name }) => name)).toEqual(['Hundred% Fresh']);
		expect((await list({ q: 'Quayside', duty: 'supplier' })).total).toBe(0);
	});

	it('answers an unknown firm as not found', async () => {
		const ctx = await as('admin');
		await expect(getPartner(ctx, ctx.actor.id)).rejects.toMatchObject({ code: 'not-found' });
	});
});

describe('a contact', () => {
	it('is added, counted, changed and kept apart from other firms’ contacts', async () => {
		const ctx = await as('admin');
		const partner = await buildPartner();
		await saveContact(ctx, partner.id, contact());
		const [kept] = (await getPartner(ctx, partner.id)).contacts;
		expect(kept).toMatchObject({ email: 'ana@tessil.example', isNotified: true });
		const row = (await listPartners(ctx, partnerQuery.parse({ q: partner.name }))).items[0];
		expect(row).toMatchObject({ contacts: 1, notified: 1 });
		await expect(saveContact(ctx, partner.id, contact())).rejects.toMatchObject({ code: 'duplicate' });

		const change = contact({ contactId: kept?.id, duty: 'claims', revision: kept?.revision });
		await expect(saveContact(ctx, (await buildPartner()).id, change)).rejects.toMatchObject({
			code: 'not-found'
		});
		await saveContact(ctx, partner.id, change);
		expect((await lastEntry('contact.saved')).data).toMatchObject({
			before: { duty: 'quality' },
			after: { duty: 'claims' }
		});
	});

	it('loses open links and sessions when switched off or moved to another address', async () => {
		const ctx = await as('admin');
		const { shipment, supplier } = await buildShipment();
		const person = await buildContact(supplier);
		const open = async (secret: string) => {
			await saveToken(
				secret,
				{ kind: 'notice', contactId: person.id, shipmentId: shipment.id, validMs: 3_600_000 },
				testNow
			);
			await LinkSession.create({
				id: crypto.randomUUID(),
				contactId: person.id,
				partnerId: supplier.id,
				shipmentId: shipment.id,
				createdAt: testNow,
				expiresAt: new Date(testNow.getTime() + 3_600_000)
			});
		};
		const live = () => LinkSession.count({ where: { contactId: person.id, revokedAt: null } });
		await open('first');
		await switchContact(ctx, supplier.id, person.id, false);
		expect(await live()).toBe(0);
		expect(await useToken('first', ['notice'], testNow)).toBeNull();

		await switchContact(ctx, supplier.id, person.id, true);
		await open('second');
		const [view] = (await getPartner(ctx, supplier.id)).contacts;
		await saveContact(
			ctx,
			supplier.id,
			contact({ contactId: person.id, email: 'new@tessil.example', revision: view?.revision })
		);
		expect(await live()).toBe(0);
		expect((await findToken('second'))?.usedAt).toEqual(testNow);
	});
});

describe('what the form takes', () => {
	it('asks for a name, a duty and a right GLN', () => {
		const issues = (input: Record<string, unknown>) =>
			partnerForm.safeParse(input).error?.issues.map((issue) => issue.path.join('.'));
		expect(issues({ isCarrier: 'on', name: ' ' })).toContain('name');
		expect(issues({ name: 'A' })).toEqual(['isSupplier']);
		expect(issues({ name: 'A', isStore: 'on', gln: '9506000050011' })).toEqual(['gln']);
		expect(issues({ name: 'A', isStore: 'on', countryCode: 'NLD' })).toEqual(['countryCode']);
	});
});
