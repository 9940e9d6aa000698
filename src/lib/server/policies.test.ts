import { describe, expect, it } from 'vitest';
import { systemContext, type Actor, type Context, type Role } from './context';
import { authorizeShipment, isWithinSight, may } from './policies';

const base = systemContext(new Date(0)).actor;
const actor = (role: Role, more: Partial<Actor> = {}): Actor => ({
	...base,
	id: 'u',
	roles: [role],
	siteIds: ['s1'],
	...more
});
const shipment = { id: 'd1', siteId: 's1', supplierId: 'p1' };
const contextOf = (who: Actor): Context => ({ ...systemContext(new Date(0)), actor: who });

describe('policies', () => {
	it('let only QA sign', () => {
		const signers = (['dock', 'qa', 'claims', 'admin', 'supplier'] as const).filter((role) =>
			may(actor(role), 'disposition.sign')
		);
		expect(signers).toEqual(['qa']);
	});

	it('show staff the dockets of their own sites only', () => {
		expect(isWithinSight(actor('qa'), shipment)).toBe(true);
		expect(isWithinSight(actor('qa'), { ...shipment, siteId: 's2' })).toBe(false);
	});

	it('show a supplier its own loads only, and a mailed link only its docket', () => {
		const own = actor('supplier', { partnerId: 'p1', siteIds: [] });
		expect(isWithinSight(own, shipment)).toBe(true);
		expect(isWithinSight(actor('supplier', { partnerId: 'p2', siteIds: ['s1'] }), shipment)).toBe(false);
		expect(isWithinSight(actor('supplier', { partnerId: null, siteIds: ['s1'] }), shipment)).toBe(false);
		expect(isWithinSight({ ...own, shipmentId: 'd2' }, shipment)).toBe(false);
	});

	it('answer a docket out of sight as one that does not exist, before saying what the role may do', () => {
		const stranger = contextOf(actor('supplier', { partnerId: 'p2' }));
		expect(() => authorizeShipment(stranger, 'disposition.sign', shipment)).toThrow(
			expect.objectContaining({ code: 'not-found' })
		);
		expect(() => authorizeShipment(stranger, 'shipment.view', null)).toThrow(
			expect.objectContaining({ code: 'not-found' })
		);
		expect(() => authorizeShipment(contextOf(actor('dock')), 'disposition.sign', shipment)).toThrow(
			expect.objectContaining({ code: 'not-allowed' })
		);
	});
});
