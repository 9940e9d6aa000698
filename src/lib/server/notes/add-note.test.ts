import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { noteInput } from '../../schemas/note';
import { AuditEntry } from '../db/models/audit-entry';
import { Note } from '../db/models/note';
import { addNote } from './add-note';

useTestDatabase();

describe('a note', () => {
	it('is written by staff of the site, also on a signed docket, once however often it is sent', async () => {
		const { shipment, site } = await buildShipment({ arrivedAt: testNow, decidedAt: testNow });
		const ctx = await contextFor(await buildUser(['claims'], { sites: [site] }));
		const note = noteInput.parse({ id: uuid(), text: ' carrier called ' });
		await addNote(ctx, shipment.number, note);
		await addNote(ctx, shipment.number, note);
		expect(await Note.findAll({ where: { shipmentId: shipment.id } })).toMatchObject([
			{ text: 'carrier called', writtenBy: ctx.actor.id, writtenAt: testNow }
		]);
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'note.written' } })).toBe(1);
	});

	it('is not for suppliers, other sites or cancelled dockets', async () => {
		const { shipment, supplier, site } = await buildShipment({ cancelledAt: testNow });
		const note = noteInput.parse({ text: 'x' });
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(addNote(own, shipment.number, note)).rejects.toMatchObject({ code: 'not-allowed' });
		const elsewhere = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(addNote(elsewhere, shipment.number, note)).rejects.toMatchObject({ code: 'not-found' });
		const ctx = await contextFor(await buildUser(['dock'], { sites: [site] }));
		await expect(addNote(ctx, shipment.number, note)).rejects.toMatchObject({ code: 'cancelled' });
	});

	it('needs words', () => {
		expect(noteInput.safeParse({ text: '  ' }).error?.issues[0]?.message).toBe('Write the note.');
	});
});
